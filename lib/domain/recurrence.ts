/**
 * Date-only recurrence rules of RFC 5545 section 3.3.10, without times of day and time zones.
 *
 * Allowed parts: FREQ (DAILY, WEEKLY, MONTHLY, YEARLY), INTERVAL, COUNT, UNTIL (a date), WKST, BYMONTH,
 * BYWEEKNO (with BYDAY), BYYEARDAY, BYMONTHDAY, BYDAY, BYSETPOS. Everything else is refused with a reason.
 * As in the RFC, all other parts come from the start; a start that does not fit its rule is no occurrence.
 *
 * A rule without COUNT is entered at the period asked about, however old its start. A rule that finds
 * nothing for a hundred years is taken to have no further occurrence, so none can run for ever.
 */
import {
  type CalendarDay,
  dayOfNumber,
  daysInMonth,
  numberOfDate,
  numberOfDay,
  partsOfNumber,
} from './calendar-day';
import { type Series, type Skip, daysOfPeriod, periodOrdinal, skipMonths } from './recurrence-days';
import { PARTS, type PartName, type Recurrence, findClash } from './recurrence-parts';

export type ParsedRecurrence =
  { ok: true; recurrence: Recurrence } | { ok: false; part: string; reason: string };

const HORIZON_DAYS = 36_525;
/** Later occurrences count as none, so that the days around one are days of the calendar as well. */
const LAST_DAY = numberOfDate(8999, 12, 31);

const refuse = (part: string, reason: string): ParsedRecurrence => ({ ok: false, part, reason });

/**
 * Reads the text of a rule such as 'FREQ=MONTHLY;BYDAY=1MO', in any case of letters. A refusal names the
 * part it is about, and its reason is a sentence that begins with that name.
 */
export function parseRecurrence(text: string): ParsedRecurrence {
  const draft: Partial<Recurrence> = {};
  const seen = new Set<string>();
  for (const piece of text.trim().toUpperCase().split(';')) {
    const equals = piece.indexOf('=');
    const [name, value] = [piece.slice(0, equals), piece.slice(equals + 1)];
    if (equals < 1 || value === '' || !/^[A-Z-]+$/.test(name)) {
      return refuse(piece || 'rule', `"${piece}" is not a rule part such as FREQ=MONTHLY`);
    }
    if (!(name in PARTS)) {
      return refuse(name, `${name} is not allowed: use ${Object.keys(PARTS).join(', ')}`);
    }
    if (seen.has(name)) return refuse(name, `${name} is given twice`);
    seen.add(name);
    const { put, expects } = PARTS[name as PartName];
    if (!put(draft, value)) return refuse(name, `${name} ${expects}`);
  }
  if (!draft.freq) return refuse('FREQ', 'FREQ is missing: DAILY, WEEKLY, MONTHLY or YEARLY');
  const recurrence: Recurrence = {
    freq: draft.freq,
    interval: draft.interval ?? 1,
    count: draft.count ?? null,
    until: draft.until ?? null,
    weekStart: draft.weekStart ?? 0,
    byMonth: draft.byMonth ?? [],
    byWeekNo: draft.byWeekNo ?? [],
    byYearDay: draft.byYearDay ?? [],
    byMonthDay: draft.byMonthDay ?? [],
    byDay: draft.byDay ?? [],
    bySetPos: draft.bySetPos ?? [],
  };
  const clash = findClash(recurrence);
  return clash ? refuse(clash.part, clash.reason) : { ok: true, recurrence };
}

/** Whether a rule has no BY part: it steps from its start and names no places in the calendar. */
export function isPlain(rule: Recurrence): boolean {
  const { byMonth, byWeekNo, byYearDay, byMonthDay, byDay } = rule;
  return !(byMonth.length || byWeekNo.length || byYearDay.length || byMonthDay.length || byDay.length);
}

function* dailySteps({ rule, start }: Series, from: number): Generator<number> {
  const step = rule.interval * (rule.freq === 'WEEKLY' ? 7 : 1);
  const count = rule.count ?? Infinity;
  for (let index = Math.max(0, Math.ceil((from - start) / step)); index < count; index++) {
    yield start + index * step;
  }
}

function* monthlySteps({ rule, start, startParts, skip }: Series, from: number): Generator<number> {
  const step = rule.interval * (rule.freq === 'YEARLY' ? 12 : 1);
  const { year, month, day } = startParts;
  const begin = year * 12 + month - 1;
  const wanted = partsOfNumber(Math.max(from, start));
  const skips = day > 28 && skip === 'omit';
  const ahead = Math.floor((wanted.year * 12 + wanted.month - 1 - begin) / step);
  let index = skips && rule.count !== null ? 0 : ahead;
  let left = (rule.count ?? Infinity) - index;
  for (; left > 0; index++) {
    const at = begin + index * step;
    const [atYear, atMonth] = [Math.floor(at / 12), (at % 12) + 1];
    if (atYear > 8999) return;
    const length = daysInMonth(atYear, atMonth);
    if (day > length && skips) continue;
    left--;
    const number = numberOfDate(atYear, atMonth, Math.min(day, length));
    if (number >= from) yield number;
  }
}

function* periodSteps(series: Series, from: number, last: number): Generator<number> {
  const { rule, start } = series;
  const first = periodOrdinal(rule, start);
  const wanted = rule.count === null ? periodOrdinal(rule, Math.max(from, start)) : first;
  let ordinal = first + Math.floor((wanted - first) / rule.interval) * rule.interval;
  let left = rule.count ?? Infinity;
  let limit = (rule.count === null ? Math.max(from, start) : start) + HORIZON_DAYS;
  for (; ; ordinal += rule.interval) {
    ordinal = skipMonths(rule, ordinal);
    const { begin, days } = daysOfPeriod(series, ordinal);
    if (begin > Math.min(limit, last)) return;
    for (const number of days) {
      if (number < start) continue;
      limit = number + HORIZON_DAYS;
      if (number >= from) yield number;
      if (--left === 0) return;
    }
  }
}

/** A rule from its start, both as day numbers, for computing with many occurrences of it. */
export function seriesOf(rule: Recurrence, start: number, skip: Skip): Series {
  return { rule, start, startParts: partsOfNumber(start), skip };
}

/** Occurrences of a series from one day number to another, or as far as the rule goes, in order. */
export function* numbersBetween(series: Series, from: number, to = LAST_DAY): Generator<number> {
  const { rule } = series;
  const last = rule.until === null ? to : Math.min(to, numberOfDay(rule.until));
  if (from > last) return;
  const stepsByDay = rule.freq === 'DAILY' || rule.freq === 'WEEKLY';
  const steps = !isPlain(rule) ? periodSteps : stepsByDay ? dailySteps : monthlySteps;
  for (const number of steps(series, from, last)) {
    if (number > last) return;
    yield number;
  }
}

/** The first occurrence of a series on a day number or later, or null when it is used up. */
export function firstNumberFrom(series: Series, from: number): number | null {
  for (const number of numbersBetween(series, from)) return number;
  return null;
}

function firstFrom(rule: Recurrence, start: CalendarDay, from: number, skip: Skip): CalendarDay | null {
  const number = firstNumberFrom(seriesOf(rule, numberOfDay(start), skip), from);
  return number === null ? null : dayOfNumber(number);
}

/** The first occurrence on `day` or later, or null when the rule is used up. Throws for an unreal day. */
export function firstOnOrAfter(
  rule: Recurrence,
  start: CalendarDay,
  day: CalendarDay,
  skip: Skip = 'omit',
): CalendarDay | null {
  return firstFrom(rule, start, numberOfDay(day), skip);
}

/** The first occurrence later than `day`, or null when the rule is used up. Throws for an unreal day. */
export function firstAfter(
  rule: Recurrence,
  start: CalendarDay,
  day: CalendarDay,
  skip: Skip = 'omit',
): CalendarDay | null {
  return firstFrom(rule, start, numberOfDay(day) + 1, skip);
}

/** Every occurrence from `from` to `to`, both included, in order. Throws for an unreal day. */
export function occurrencesBetween(
  rule: Recurrence,
  start: CalendarDay,
  from: CalendarDay,
  to: CalendarDay,
  skip: Skip = 'omit',
): CalendarDay[] {
  const series = seriesOf(rule, numberOfDay(start), skip);
  const last = Math.min(numberOfDay(to), LAST_DAY);
  return Array.from(numbersBetween(series, numberOfDay(from), last), dayOfNumber);
}
