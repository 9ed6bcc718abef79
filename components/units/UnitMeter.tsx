import { hoursText } from '@/components/rules/due-words';
import { Waterline } from '@/components/waterline/Waterline';
import { Timestamp } from '@/components/ui/Timestamp';
import type { UnitPage } from '@/lib/schemas/fleet';
import { toWaterline } from './FleetPicture';
import { roomLines } from './unit-words';

/** The unit's meter in large figures, and beside it the unit on its own water line. */
export function UnitMeter({ page }: { page: UnitPage }) {
  const { unit, shownHours, timeZone, now } = page;
  const floating = toWaterline(unit);
  const [hours = '', fraction = ''] = unit.engineHours.toFixed(1).split('.');
  return (
    <section aria-label="Meter" className="grid items-start gap-6 lg:grid-cols-2">
      <div className="grid content-start gap-2">
        <h2 className="text-xl">Engine hours</h2>
        <p className="numerals text-5xl font-bold sm:text-7xl">
          {hours}
          <span className="text-ink-soft">.{fraction}</span>
          <span className="text-2xl font-normal"> h</span>
        </p>
        <p>
          Last read <Timestamp at={unit.readAt} now={now} timeZone={timeZone} />
        </p>
        {shownHours === unit.engineHours ? null : (
          <p className="text-ink-soft">
            The meter shows {hoursText(shownHours)}; earlier meters had run the rest.
          </p>
        )}
        <p>
          <span className="numerals font-bold">{unit.outings}</span>{' '}
          {unit.outings === 1 ? 'outing' : 'outings'} so far
        </p>
      </div>
      {floating ? (
        <div>
          <h2 className="text-xl">Before its next hold</h2>
          <p>
            {roomLines(unit).join(', ') || 'No rule holds this unit next.'}
            {unit.holdingRuleName ? `. What comes first: ${unit.holdingRuleName}.` : null}
          </p>
          <Waterline unit={floating} />
        </div>
      ) : null}
    </section>
  );
}
