/** On which day of the calendar a duty or a task stands. */
import type { CalendarDay } from './calendar-day';
import type { DueState } from './due';

/** What places one duty. `state` is null for a task that follows from no rule. */
export type PlaceFacts = {
  plannedOn: CalendarDay | null;
  state: DueState | null;
  dueOn: CalendarDay | null;
  /** Today at the unit's dock. */
  today: CalendarDay;
};

/**
 * The one day on which open work stands, null when it has none yet. It is the day it is planned on; without a plan,
 * today once it is due or overdue by whichever trigger, and before that the day it is due by the calendar.
 *
 * What is not done does not stay behind: a plan for a day gone by stands on today too. So the calendar before today
 * holds only what was done, and nothing overdue is out of sight. A duty due on 2026-07-03 and not done stands on
 * 2026-07-03 until that day is over, then on each today; `dueOn` goes on saying when it fell due.
 */
export function placeOnCalendar({ plannedOn, state, dueOn, today }: PlaceFacts): CalendarDay | null {
  if (plannedOn !== null) return plannedOn < today ? today : plannedOn;
  if (state === 'due' || state === 'overdue') return today;
  return dueOn;
}
