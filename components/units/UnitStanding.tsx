import Link from 'next/link';
import { StateMark } from '@/components/state/StateMark';
import { Notice } from '@/components/ui/Notice';
import { Timestamp } from '@/components/ui/Timestamp';
import type { UnitPage } from '@/lib/schemas/fleet';

/** What the unit is now, and every reason that holds it with what lifts that. */
export function UnitStanding({ page }: { page: UnitPage }) {
  const { unit, out, now, timeZone } = page;
  if (unit.state === null)
    return (
      <Notice still title="Retired">
        {unit.retiredAt ? <Timestamp at={unit.retiredAt} now={now} timeZone={timeZone} /> : null}
        <p>Its history stays here; nothing more comes due.</p>
      </Notice>
    );
  return (
    <section aria-label="State" className="grid gap-3">
      <div>
        <StateMark state={unit.state} size="large" />
      </div>
      {out ? (
        <p>
          {out.startedAt ? (
            <>
              Out since <Timestamp at={out.startedAt} now={now} timeZone={timeZone} show="absolute" />
            </>
          ) : (
            'Out'
          )}
          {out.dueBackAt ? (
            <>
              , due back <Timestamp at={out.dueBackAt} now={now} timeZone={timeZone} />
            </>
          ) : null}
        </p>
      ) : null}
      {unit.holds.length > 0 ? (
        <ul className="grid gap-2">
          {unit.holds.map((hold, index) => (
            <li key={index} className="max-w-prose border-l-4 border-held pl-3">
              <p>{hold.text}</p>
              <p className="text-ink-soft">
                Since <Timestamp at={hold.since} now={now} timeZone={timeZone} show="absolute" />
              </p>
              {hold.taskId ? (
                <Link href={`/tasks/${hold.taskId}`} className="link inline-flex min-h-target items-center">
                  Open its task
                </Link>
              ) : null}
            </li>
          ))}
        </ul>
      ) : null}
    </section>
  );
}
