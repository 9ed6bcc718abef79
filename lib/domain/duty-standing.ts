/**
 * How a duty (a rule on a unit) stands by its stored due points: its worst trigger, and how much is left of each.
 */
import { type CalendarDay, daysBetween } from './calendar-day';
import { type DuePoint, type DueState, type Standing, computeState } from './due';

/** A due point as it is stored: the three columns of its kind, the others null. */
export type DuePointColumns = {
  due_tenths: number | null;
  upcoming_from_tenths: number | null;
  overdue_from_tenths: number | null;
  due_outings: number | null;
  upcoming_from_outings: number | null;
  overdue_from_outings: number | null;
  due_on: CalendarDay | null;
  upcoming_from_on: CalendarDay | null;
  overdue_from_on: CalendarDay | null;
};

/** A due point with its state, and what is left (tenths, outings or days) until it is due and until overdue. */
export type PointStanding = { point: DuePoint; state: DueState; left: number; leftToOverdue: number };

/** The due point of a stored row. Throws RangeError when the row is of no kind. */
export function toDuePoint(row: DuePointColumns): DuePoint {
  if (row.due_tenths !== null && row.upcoming_from_tenths !== null && row.overdue_from_tenths !== null)
    return {
      on: 'engine_hours',
      dueTenths: row.due_tenths,
      upcomingFromTenths: row.upcoming_from_tenths,
      overdueFromTenths: row.overdue_from_tenths,
    };
  if (row.due_outings !== null && row.upcoming_from_outings !== null && row.overdue_from_outings !== null)
    return {
      on: 'outings',
      dueOutings: row.due_outings,
      upcomingFromOutings: row.upcoming_from_outings,
      overdueFromOutings: row.overdue_from_outings,
    };
  if (row.due_on !== null && row.upcoming_from_on !== null && row.overdue_from_on !== null)
    return {
      on: 'calendar',
      dueOn: row.due_on,
      upcomingFromOn: row.upcoming_from_on,
      overdueFromOn: row.overdue_from_on,
    };
  throw new RangeError('a stored due point is of no kind');
}

/** What is left of one due point: 0 at the due point, negative past it. */
export function computePointStanding(point: DuePoint, standing: Standing): PointStanding {
  const state = computeState(point, standing);
  switch (point.on) {
    case 'engine_hours': {
      const hours = standing.engineHoursTenths;
      return { point, state, left: point.dueTenths - hours, leftToOverdue: point.overdueFromTenths - hours };
    }
    case 'outings': {
      const count = standing.outings;
      return {
        point,
        state,
        left: point.dueOutings - count,
        leftToOverdue: point.overdueFromOutings - count,
      };
    }
    case 'calendar': {
      const { today } = standing;
      return {
        point,
        state,
        left: daysBetween(today, point.dueOn),
        leftToOverdue: daysBetween(today, point.overdueFromOn),
      };
    }
  }
}

/** The day a duty is due by the calendar: the earliest of its calendar points, null when it has none. */
export function findDueDay(points: readonly DuePoint[]): CalendarDay | null {
  return points.reduce<CalendarDay | null>(
    (first, point) =>
      point.on === 'calendar' && (first === null || point.dueOn < first) ? point.dueOn : first,
    null,
  );
}
