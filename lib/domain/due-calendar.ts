import { type CalendarDay, addDays } from './calendar-day';
import { firstAfter, firstOnOrAfter, isPlain, occurrencesBetween, parseRecurrence } from './recurrence';
import type { Skip } from './recurrence-days';
import type { Recurrence } from './recurrence-parts';
import type { CalendarTrigger, Window } from './rule';

/** Where the replay of a calendar trigger stands: the series it is on, and the occurrence now due. */
export type CalendarCursor = {
  anchor: CalendarTrigger['anchor'];
  rule: Recurrence;
  start: CalendarDay;
  skip: Skip;
  dueOn: CalendarDay | null;
};

function readRule(text: string): Recurrence {
  const parsed = parseRecurrence(text);
  if (!parsed.ok) throw new RangeError(parsed.reason);
  return parsed.recurrence;
}

/** The first occurrence on or after both the rule's start and the day the unit entered service. */
export function beginCalendar(trigger: CalendarTrigger, enteredServiceOn: CalendarDay): CalendarCursor {
  const rule = readRule(trigger.rrule);
  const skip: Skip = trigger.anchor === 'completed' ? 'backward' : 'omit';
  const from = trigger.start > enteredServiceOn ? trigger.start : enteredServiceOn;
  const dueOn = firstOnOrAfter(rule, trigger.start, from, skip);
  return { anchor: trigger.anchor, rule, start: trigger.start, skip, dueOn };
}

/**
 * The rule begun again on the day of a closing. COUNT is of the whole duty: what was due up to now is used
 * up, and the day of the closing itself, where it fits, must not use up one more.
 */
function restart(cursor: CalendarCursor, dueOn: CalendarDay, on: CalendarDay): CalendarCursor {
  const { rule, start, skip, anchor } = cursor;
  let next = rule;
  if (rule.count !== null) {
    const left = rule.count - occurrencesBetween(rule, start, start, dueOn, skip).length;
    if (left <= 0) return { ...cursor, dueOn: null };
    const fitsItself = firstOnOrAfter({ ...rule, count: null }, on, on, 'backward') === on;
    next = { ...rule, count: left + (fitsItself ? 1 : 0) };
  }
  return { anchor, rule: next, start: on, skip: 'backward', dueOn: firstAfter(next, on, on, 'backward') };
}

/**
 * The replay after a closing. Anchored on completion the rule begins again on that day. Scheduled and closed
 * inside the window, both ends included, the next occurrence after the due one follows. Outside it a rule of
 * FREQ and INTERVAL alone begins again; one that names places in the calendar keeps them: too early leaves
 * the occurrence due, too late moves to the first one after the closing.
 */
export function closeCalendar(cursor: CalendarCursor, on: CalendarDay, window: Window): CalendarCursor {
  const { anchor, rule, start, skip, dueOn } = cursor;
  if (dueOn === null) return cursor;
  if (anchor === 'completed') return restart(cursor, dueOn, on);
  const early = on < addDays(dueOn, -window.earlyDays);
  const late = on > addDays(dueOn, window.lateDays);
  if (!early && !late) return { ...cursor, dueOn: firstAfter(rule, start, dueOn, skip) };
  if (isPlain(rule)) return restart(cursor, dueOn, on);
  return early ? cursor : { ...cursor, dueOn: firstAfter(rule, start, on, skip) };
}
