import type { StoredPoint } from '@/db/queries/readiness';
import type { DuePoint } from '@/lib/domain/due';

/** A stored due point as the domain has it. */
export function toDuePoint(row: StoredPoint): DuePoint {
  if (row.due_tenths !== null)
    return {
      on: 'engine_hours',
      dueTenths: row.due_tenths,
      upcomingFromTenths: row.upcoming_from_tenths!,
      overdueFromTenths: row.overdue_from_tenths!,
    };
  if (row.due_outings !== null)
    return {
      on: 'outings',
      dueOutings: row.due_outings,
      upcomingFromOutings: row.upcoming_from_outings!,
      overdueFromOutings: row.overdue_from_outings!,
    };
  return {
    on: 'calendar',
    dueOn: row.due_on!,
    upcomingFromOn: row.upcoming_from_on!,
    overdueFromOn: row.overdue_from_on!,
  };
}
