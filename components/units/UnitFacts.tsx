import { CalendarDay } from '@/components/ui/CalendarDay';
import { DescriptionList } from '@/components/ui/DescriptionList';
import type { Unit } from '@/lib/schemas/unit';
import { carburettorText } from './unit-words';

/** What the unit is by its papers. */
export function UnitFacts({ unit }: { unit: Unit }) {
  const number = (text: string | null) =>
    text === null ? (
      <span className="text-ink-soft">not given</span>
    ) : (
      <span className="numerals">{text}</span>
    );
  return (
    <DescriptionList
      items={[
        { term: 'Model', detail: unit.modelName },
        { term: 'Dock', detail: unit.dockName },
        { term: 'Carburettors', detail: carburettorText(unit.carbCount) },
        { term: 'Hull number (HIN)', detail: number(unit.hin) },
        { term: 'Registration', detail: number(unit.registration) },
        { term: 'In service since', detail: <CalendarDay date={unit.enteredServiceOn} /> },
      ]}
    />
  );
}
