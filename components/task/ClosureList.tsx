import { Timestamp } from '@/components/ui/Timestamp';
import type { Closure } from '@/lib/schemas/task';
import { ReasonDialog } from './ReasonDialog';
import { minutesText } from './task-words';

/** Closures, the latest first, reversed ones struck through and said so. `mayReverse` shows a manager's button. */
export function ClosureList({
  closures,
  timeZone,
  now,
  mayReverse,
}: {
  closures: Closure[];
  timeZone: string;
  now: string;
  mayReverse: boolean;
}) {
  return (
    <ol className="grid gap-4">
      {closures.map((closure) => (
        <li key={closure.id} className="grid gap-1 border-l-4 border-line pl-4">
          <p className={closure.reversedAt ? 'line-through' : undefined}>
            <Timestamp at={closure.closedAt} now={now} timeZone={timeZone} show="absolute" />, at{' '}
            <span className="numerals">{closure.engineHours.toFixed(1)} h</span> and outing {closure.outings},
            by {closure.closedBy?.name ?? 'the system'}
            {closure.minutes === null ? null : `, ${minutesText(closure.minutes)} of work`}.
          </p>
          {closure.note ? <p className="whitespace-pre-line text-ink-soft">{closure.note}</p> : null}
          <p className="no-print">
            <a
              className="link inline-flex min-h-target items-center"
              href={`/api/v1/closures/${closure.id}/record.pdf`}
            >
              Service record (PDF)
            </a>
          </p>
          {closure.partsUsed.length > 0 ? (
            <p className="text-ink-soft">
              Parts: {closure.partsUsed.map(({ quantity, name }) => `${quantity} × ${name}`).join(', ')}.
            </p>
          ) : null}
          {closure.reversedAt ? (
            <p className="font-semibold">
              Reversed by {closure.reversedBy?.name ?? 'the system'}: {closure.reverseReason}
            </p>
          ) : mayReverse ? (
            <div className="no-print">
              <ReasonDialog
                path={`/api/v1/closures/${closure.id}/reversal`}
                button="Reverse this closing"
                title="Reverse this closing?"
              >
                <p>
                  It stays on record and no longer counts. The task opens again, and the unit is held until
                  its due points are back.
                </p>
              </ReasonDialog>
            </div>
          ) : null}
        </li>
      ))}
    </ol>
  );
}
