import { type CalendarDay, dayOfNumber, numberOfDay } from './calendar-day';
import { firstNumberFrom, isPlain, numbersBetween, parseRecurrence, seriesOf } from './recurrence';
import type { Series } from './recurrence-days';
import type { Recurrence } from './recurrence-parts';
import type { CalendarTrigger, Window } from './rule';

/** Where the replay of a calendar trigger stands: its series, and the occurrence now due as a day number. */
export type CalendarCursor = { anchor: CalendarTrigger['anchor']; series: Series; due: number | null };

function readRule(text: string): Recurrence {
  const parsed = parseRecurrence(text);
  if (!parsed.ok) throw new RangeError(parsed.reason);
  return parsed.recurrence;
}

/** The day a replay has come to, or null when its rule is used up. */
export function dueDayOf({ due }: CalendarCursor): CalendarDay | null {
  return due === null ? null : dayOfNumber(due);
}

/** A trigger's series as it begins, read once however many units it is computed for. */
const begun = new WeakMap<CalendarTrigger, Series>();

function seriesFromStart(trigger: CalendarTrigger): Series {
  let series = begun.get(trigger);
  if (!series) {
    const skip = trigger.anchor === 'completed' ? 'backward' : 'omit';
    series = seriesOf(readRule(trigger.rrule), numberOfDay(trigger.start), skip);
    begun.set(trigger, series);
  }
  return series;
}

/**
 * The occurrences of a series with COUNT that were found so far, which are counted from its start, and the rest of
 * them: each is looked for once, however many closings are replayed.
 */
const counted = new WeakMap<Series, { found: number[]; rest: Generator<number> }>();

/** The first so many occurrences of a series with COUNT, up to the first on `from` or later where there is one. */
function countTo(series: Series, from: number): readonly number[] {
  let known = counted.get(series);
  if (!known) counted.set(series, (known = { found: [], rest: numbersBetween(series, series.start) }));
  while ((known.found.at(-1) ?? -Infinity) < from) {
    const next = known.rest.next();
    if (next.done) break;
    known.found.push(next.value);
  }
  return known.found;
}

/** First occurrences that were looked for already, by the day from which on: those of many units are the same. */
const firsts = new WeakMap<Series, Map<number, number | null>>();

function firstOf(series: Series, from: number): number | null {
  if (series.rule.count !== null) return countTo(series, from).find((number) => number >= from) ?? null;
  if (isPlain(series.rule)) return firstNumberFrom(series, from);
  let known = firsts.get(series);
  if (!known) firsts.set(series, (known = new Map()));
  let first = known.get(from);
  if (first === undefined) known.set(from, (first = firstNumberFrom(series, from)));
  return first;
}

/** The first occurrence on or after both the rule's start and the day the unit entered service. */
export function beginCalendar(trigger: CalendarTrigger, enteredServiceOn: CalendarDay): CalendarCursor {
  const series = seriesFromStart(trigger);
  const due = firstOf(series, Math.max(series.start, numberOfDay(enteredServiceOn)));
  return { anchor: trigger.anchor, series, due };
}

/**
 * What is left of a rule with COUNT when it begins again on a day. COUNT is of the whole duty: what was due
 * up to now is used up, and the day of the closing itself, where it fits the rule, must not use up one more.
 */
function withCountLeft(series: Series, due: number, on: number): Recurrence | null {
  const { rule } = series;
  if (rule.count === null) return rule;
  const left = rule.count - countTo(series, due).filter((number) => number <= due).length;
  if (left <= 0) return null;
  const endless = seriesOf({ ...rule, count: null }, on, 'backward');
  return { ...rule, count: numbersBetween(endless, on, on).next().done ? left : left + 1 };
}

function restart({ anchor, series, due }: CalendarCursor, on: number): CalendarCursor {
  const rule = due === null ? null : withCountLeft(series, due, on);
  if (rule === null) return { anchor, series, due: null };
  const next = seriesOf(rule, on, 'backward');
  return { anchor, series: next, due: firstOf(next, on + 1) };
}

/**
 * The replay after a closing. Anchored on completion the rule begins again on that day. Scheduled and closed
 * inside the window, both ends included, the next occurrence after the due one follows. Outside it a rule of
 * FREQ and INTERVAL alone begins again; one that names places in the calendar keeps them: too early leaves
 * the occurrence due, too late moves to the first one after the closing.
 */
export function closeCalendar(cursor: CalendarCursor, on: number, window: Window): CalendarCursor {
  const { anchor, series, due } = cursor;
  if (due === null) return cursor;
  if (anchor === 'completed') return restart(cursor, on);
  const early = on < due - window.earlyDays;
  const late = on > due + window.lateDays;
  if ((early || late) && isPlain(series.rule)) return restart(cursor, on);
  if (early) return cursor;
  return { anchor, series, due: firstOf(series, (late ? on : due) + 1) };
}
