import { sql, type RawBuilder } from 'kysely';
import type { DuePointColumns } from '@/lib/domain/duty-standing';

/** A due point's thresholds, in the order in which a meter or the calendar reaches them. */
export type Threshold = 'upcoming_from' | 'due' | 'overdue_from';

/** The day at dock `d` at an instant. */
export const localDayAt = (now: Date): RawBuilder<string> =>
  sql`(${now}::timestamptz at time zone d.time_zone)::date`;

/**
 * Whether due point `p` has come to this threshold, with where the unit's meters stand in the row `meter` and the
 * day at its dock: at the threshold it has (≥), as in `computeState`. Null, not false, when it has not, for the
 * columns of the other measures are null.
 */
export function hasReached(
  threshold: Threshold,
  { meter, today }: { meter: string; today: RawBuilder<string> },
): RawBuilder<boolean> {
  const point = (column: keyof DuePointColumns) => sql.ref(`p.${column}`);
  return sql`(${sql.ref(`${meter}.engine_hours_tenths`)} >= ${point(`${threshold}_tenths`)}
    or ${sql.ref(`${meter}.outing_count`)} >= ${point(`${threshold}_outings`)}
    or ${today} >= ${point(`${threshold}_on`)})`;
}
