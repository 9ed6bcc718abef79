import { Button } from '@/components/ui/Button';
import { StateMark } from '@/components/state/StateMark';
import { Tag } from '@/components/ui/Tag';
import type { CalendarDuty } from '@/lib/schemas/calendar';
import { dueText, leftText } from './calendar-words';

/** Work without a day, the nearest first; each opens the dialog that plans it. */
export function UndatedList({
  duties,
  mayPlan,
  onPick,
}: {
  duties: CalendarDuty[];
  mayPlan: boolean;
  onPick: (duty: CalendarDuty) => void;
}) {
  if (duties.length === 0) return <p className="text-ink-soft">Everything coming up has a day.</p>;
  return (
    <ul className="grid">
      {duties.map((duty) => (
        <li key={duty.id} className="grid gap-1 border-b border-hairline py-3">
          <p className="flex flex-wrap items-center gap-x-3 gap-y-1">
            <span className="numerals font-bold">{duty.fleetNumber}</span>
            {duty.state === 'open' || duty.state === 'closed' ? (
              <Tag>Open</Tag>
            ) : (
              <StateMark state={duty.state} plain />
            )}
          </p>
          <p className="font-semibold">{duty.title}</p>
          <p className="text-ink-soft">{[leftText(duty), dueText(duty)].filter(Boolean).join('. ')}</p>
          <div>
            <Button
              aria-label={`${mayPlan ? 'Plan' : 'Look at'} ${duty.title} on ${duty.fleetNumber}`}
              onClick={() => onPick(duty)}
            >
              {mayPlan ? 'Plan' : 'Look'}
            </Button>
          </div>
        </li>
      ))}
    </ul>
  );
}
