import type { TaskStandingRow } from '@/db/queries/tasks';
import { describeMoment } from '@/lib/domain/moment-words';
import { Refusal } from '@/lib/errors';

/** The `conflict` for a task that has ended, saying how, by whom and when. */
export function refuseEnded(row: TaskStandingRow): Refusal {
  const message = row.closed_at
    ? `${row.closer_name ?? 'The system'} closed this task already, on ${describeMoment(row.closed_at, row.time_zone)}.`
    : `This task was withdrawn${row.ended_at ? ` on ${describeMoment(row.ended_at, row.time_zone)}` : ''}: ${row.withdraw_reason ?? ''}`;
  return new Refusal('conflict', message, [{ path: 'id', message }]);
}
