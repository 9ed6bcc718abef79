/**
 * When a duty is next due on a unit, and how it stands. Engine hours are whole tenths throughout.
 *
 * Each trigger is computed by itself by replaying the closings of its rule, in the order they happened,
 * from the first due point; one closing answers all triggers, and the rule is due when its first trigger is.
 */
import { type CalendarDay, addDays, numberOfDay } from './calendar-day';
import { type CalendarCursor, beginCalendar, closeCalendar, dueDayOf } from './due-calendar';
import type { MeterTrigger, Schedule, Trigger, Window } from './rule';

/** That the work was done: on which day, at what engine hours and outing count of the unit. */
export type Closing = { on: CalendarDay; engineHoursTenths: number; outings: number };
/** What due points follow from on the side of the unit. Closings stand in the order they happened. */
export type History = { enteredServiceOn: CalendarDay; closings: readonly Closing[] };
/** What the meters of a unit show, and today by its dock's calendar. */
export type Standing = { engineHoursTenths: number; outings: number; today: CalendarDay };

/** When a trigger is next due, with the points at which it becomes upcoming and overdue, all inclusive. */
export type DuePoint =
  | { on: 'engine_hours'; dueTenths: number; upcomingFromTenths: number; overdueFromTenths: number }
  | { on: 'outings'; dueOutings: number; upcomingFromOutings: number; overdueFromOutings: number }
  | { on: 'calendar'; dueOn: CalendarDay; upcomingFromOn: CalendarDay; overdueFromOn: CalendarDay };

export type DueState = 'clear' | 'upcoming' | 'due' | 'overdue';
/** From best to worst. */
export const DUE_STATES: readonly DueState[] = ['clear', 'upcoming', 'due', 'overdue'];

function meterSlack({ on }: MeterTrigger, window: Window): { early: number; late: number } {
  return on === 'outings'
    ? { early: window.earlyOutings, late: window.lateOutings }
    : { early: window.earlyTenths, late: window.lateTenths };
}

/**
 * Closed inside the window (both ends included), a scheduled duty is next due `every` after it was due, so
 * that lateness and earliness are not passed on; outside it, or anchored on completion, `every` after it was
 * done (US Army TM 1-1500-328-23 for the window; 14 CFR 91.409(b) for excess that counts into the next).
 */
function computeMeterDue(trigger: MeterTrigger, window: Window, closings: readonly Closing[]): number {
  const { early, late } = meterSlack(trigger, window);
  let due = trigger.first ?? trigger.every;
  for (const closing of closings) {
    const done = trigger.on === 'outings' ? closing.outings : closing.engineHoursTenths;
    const onSchedule = trigger.anchor === 'scheduled' && done >= due - early && done <= due + late;
    due = (onSchedule ? due : done) + trigger.every;
  }
  return due;
}

function replayCalendar(
  trigger: Extract<Trigger, { on: 'calendar' }>,
  window: Window,
  { enteredServiceOn, closings }: History,
): CalendarCursor {
  return closings.reduce(
    (cursor, { on }) => closeCalendar(cursor, numberOfDay(on), window),
    beginCalendar(trigger, enteredServiceOn),
  );
}

/**
 * The next due point of one trigger, or null when its calendar rule is used up.
 *
 * Every 25.0 h, 2.5 h early and late, first due at 1472.7 h and closed at 1471.0 h: due at 1497.7 h.
 * Throws RangeError when a recurrence rule is not allowed or a day is not real; both are refused on input.
 */
export function computeDuePoint(
  trigger: Trigger,
  { lead, window }: Pick<Schedule, 'lead' | 'window'>,
  history: History,
): DuePoint | null {
  if (trigger.on === 'calendar') {
    const dueOn = dueDayOf(replayCalendar(trigger, window, history));
    if (dueOn === null) return null;
    return {
      on: 'calendar',
      dueOn,
      upcomingFromOn: addDays(dueOn, -lead.days),
      overdueFromOn: addDays(dueOn, window.lateDays + 1),
    };
  }
  const due = computeMeterDue(trigger, window, history.closings);
  const { late } = meterSlack(trigger, window);
  return trigger.on === 'outings'
    ? {
        on: 'outings',
        dueOutings: due,
        upcomingFromOutings: due - lead.outings,
        overdueFromOutings: due + late,
      }
    : {
        on: 'engine_hours',
        dueTenths: due,
        upcomingFromTenths: due - lead.tenths,
        overdueFromTenths: due + late,
      };
}

/** The next due point of every trigger of a schedule, by trigger index. */
export function computeDuePoints(schedule: Schedule, history: History): (DuePoint | null)[] {
  return schedule.triggers.map((trigger) => computeDuePoint(trigger, schedule, history));
}

function rank<T extends number | string>(now: T, upcomingFrom: T, due: T, overdueFrom: T): DueState {
  if (now >= overdueFrom) return 'overdue';
  if (now >= due) return 'due';
  return now >= upcomingFrom ? 'upcoming' : 'clear';
}

/**
 * How a unit stands at one due point; a trigger without a due point is clear. A meter is overdue at the due
 * point plus the late allowance (≥), the calendar on the day after it (>), so that a last day is a whole day.
 */
export function computeState(point: DuePoint | null, standing: Standing): DueState {
  if (!point) return 'clear';
  switch (point.on) {
    case 'engine_hours':
      return rank(
        standing.engineHoursTenths,
        point.upcomingFromTenths,
        point.dueTenths,
        point.overdueFromTenths,
      );
    case 'outings':
      return rank(standing.outings, point.upcomingFromOutings, point.dueOutings, point.overdueFromOutings);
    case 'calendar':
      return rank(standing.today, point.upcomingFromOn, point.dueOn, point.overdueFromOn);
  }
}

/** The worst of some states; clear when there are none. */
export function computeWorstState(states: readonly DueState[]): DueState {
  return states.reduce<DueState>(
    (worst, state) => (DUE_STATES.indexOf(state) > DUE_STATES.indexOf(worst) ? state : worst),
    'clear',
  );
}

/**
 * Up to `count` points after the due one, each taken as closed when due: tenths of an hour, outings or days
 * according to the trigger. Fewer when the calendar rule is used up.
 */
export function computeFollowing(
  trigger: Trigger,
  { window }: Pick<Schedule, 'window'>,
  history: History,
  count: number,
): (number | CalendarDay)[] {
  if (trigger.on !== 'calendar') {
    const due = computeMeterDue(trigger, window, history.closings);
    return Array.from({ length: count }, (_, index) => due + trigger.every * (index + 1));
  }
  const following: CalendarDay[] = [];
  let cursor = replayCalendar(trigger, window, history);
  while (cursor.due !== null && following.length < count) {
    cursor = closeCalendar(cursor, cursor.due, window);
    const next = dueDayOf(cursor);
    if (next !== null) following.push(next);
  }
  return following;
}
