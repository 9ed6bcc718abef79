import {
  type DateParts,
  daysInMonth,
  isLeapYear,
  numberOfDate,
  partsOfNumber,
  weekdayIndex,
} from './calendar-day';
import type { Recurrence } from './recurrence-parts';

/**
 * What to do with a month or year step that lands on a day its month does not have (RFC 7529 section 4.1):
 * leave it out, or fall back to the last day of that month.
 */
export type Skip = 'omit' | 'backward';

/** A rule with its start, as day numbers: what every period of it is expanded from. */
export type Series = { rule: Recurrence; start: number; startParts: DateParts; skip: Skip };

/** Days after the first day of the week that a day number falls on. */
const intoWeek = (number: number, weekStart: number) => (weekdayIndex(number) - weekStart + 7) % 7;

/** The count of days, weeks, months or years up to a day: the unit a rule's INTERVAL steps in. */
export function periodOrdinal({ freq, weekStart }: Recurrence, number: number): number {
  if (freq === 'DAILY') return number;
  if (freq === 'WEEKLY') return Math.floor((number - intoWeek(number, weekStart)) / 7);
  const { year, month } = partsOfNumber(number);
  return freq === 'MONTHLY' ? year * 12 + month - 1 : year;
}

/** The first week of a year is the first with at least four of its days (RFC 5545, BYWEEKNO; ISO 8601). */
function firstWeekOf(year: number, weekStart: number): number {
  const fourth = numberOfDate(year, 1, 4);
  return fourth - intoWeek(fourth, weekStart);
}

/** The first day of the week a WEEKLY period is; day number 0 was a Thursday. */
const beginOfWeek = (ordinal: number, weekStart: number) => ordinal * 7 + ((weekStart + 4) % 7);

/**
 * The period itself; or, where FREQ is DAILY or WEEKLY and all its days are in months the rule does not name, the
 * first further on, in steps of INTERVAL, that reaches into one it names: so a day that comes once in many years is
 * found without looking at all their days.
 */
export function skipMonths({ freq, interval, byMonth, weekStart }: Recurrence, ordinal: number): number {
  if (byMonth.length === 0 || freq === 'MONTHLY' || freq === 'YEARLY') return ordinal;
  const length = freq === 'DAILY' ? 1 : 7;
  const begin = freq === 'DAILY' ? ordinal : beginOfWeek(ordinal, weekStart);
  const { year, month } = partsOfNumber(begin);
  const last = partsOfNumber(begin + length - 1);
  if (byMonth.includes(month) || byMonth.includes(last.month)) return ordinal;
  const ahead = Math.min(...byMonth.map((wanted) => (wanted > month ? wanted - month : wanted - month + 12)));
  const target = year * 12 + month - 1 + ahead;
  const wanted = numberOfDate(Math.floor(target / 12), (target % 12) + 1, 1);
  const periods = Math.ceil((wanted - (begin + length - 1)) / (length * interval));
  return ordinal + Math.max(periods, 0) * interval;
}

function fitsWeekNo({ byWeekNo, weekStart }: Recurrence, number: number): boolean {
  const begin = number - intoWeek(number, weekStart);
  const { year } = partsOfNumber(begin + 3);
  const first = firstWeekOf(year, weekStart);
  const week = (begin - first) / 7 + 1;
  const weeks = (firstWeekOf(year + 1, weekStart) - first) / 7;
  return byWeekNo.includes(week) || byWeekNo.includes(week - weeks - 1);
}

function fitsByDay(rule: Recurrence, number: number, { year, month, day }: DateParts): boolean {
  const weekday = weekdayIndex(number);
  for (const wanted of rule.byDay) {
    if (wanted.weekday !== weekday) continue;
    if (wanted.nth === null) return true;
    const withinMonth = rule.freq === 'MONTHLY' || rule.byMonth.length > 0;
    const before = withinMonth ? day - 1 : number - numberOfDate(year, 1, 1);
    const length = withinMonth ? daysInMonth(year, month) : isLeapYear(year) ? 366 : 365;
    const aside = wanted.nth > 0 ? before : length - 1 - before;
    if (Math.floor(aside / 7) + 1 === Math.abs(wanted.nth)) return true;
  }
  return false;
}

/** What a rule leaves unsaid is taken from its start (RFC 5545 section 3.3.10). */
function fitsStart({ rule, start, startParts, skip }: Series, number: number, parts: DateParts): boolean {
  if (rule.byDay.length || rule.byMonthDay.length || rule.byYearDay.length) return true;
  if (rule.freq === 'DAILY') return true;
  if (rule.freq === 'WEEKLY') return weekdayIndex(number) === weekdayIndex(start);
  const length = daysInMonth(parts.year, parts.month);
  return parts.day === (skip === 'backward' ? Math.min(startParts.day, length) : startParts.day);
}

function fits(series: Series, number: number, parts: DateParts): boolean {
  const { rule } = series;
  const { year, month, day } = parts;
  if (rule.byMonth.length && !rule.byMonth.includes(month)) return false;
  if (rule.byMonthDay.length) {
    const fromEnd = day - daysInMonth(year, month) - 1;
    if (!rule.byMonthDay.includes(day) && !rule.byMonthDay.includes(fromEnd)) return false;
  }
  if (rule.byYearDay.length) {
    const ofYear = number - numberOfDate(year, 1, 1) + 1;
    const fromEnd = ofYear - (isLeapYear(year) ? 366 : 365) - 1;
    if (!rule.byYearDay.includes(ofYear) && !rule.byYearDay.includes(fromEnd)) return false;
  }
  if (rule.byDay.length && !fitsByDay(rule, number, parts)) return false;
  if (rule.byWeekNo.length && !fitsWeekNo(rule, number)) return false;
  return fitsStart(series, number, parts);
}

function daysOfMonth(series: Series, year: number, month: number): number[] {
  const { byMonth } = series.rule;
  if (byMonth.length && !byMonth.includes(month)) return [];
  const before = numberOfDate(year, month, 1) - 1;
  const found: number[] = [];
  for (let day = 1; day <= daysInMonth(year, month); day++) {
    if (fits(series, before + day, { year, month, day })) found.push(before + day);
  }
  return found;
}

function daysFrom(series: Series, begin: number, length: number): number[] {
  const found: number[] = [];
  for (let number = begin; number < begin + length; number++) {
    if (fits(series, number, partsOfNumber(number))) found.push(number);
  }
  return found;
}

/** BYSETPOS takes places of the whole set of one period; a place the set does not have takes nothing. */
function pickPlaces(days: number[], places: number[]): number[] {
  return days.filter((_, at) => places.includes(at + 1) || places.includes(at - days.length));
}

/**
 * The day numbers of one period of a rule with BY parts, in order, whatever its start, COUNT or UNTIL.
 * Days of a week that reaches over New Year belong to the calendar year they fall in.
 */
export function daysOfPeriod(series: Series, ordinal: number): { begin: number; days: number[] } {
  const { freq, weekStart, bySetPos } = series.rule;
  const expand = (begin: number, days: number[]) => ({
    begin,
    days: bySetPos.length ? pickPlaces(days, bySetPos) : days,
  });
  if (freq === 'DAILY') return expand(ordinal, daysFrom(series, ordinal, 1));
  if (freq === 'WEEKLY') {
    const begin = beginOfWeek(ordinal, weekStart);
    return expand(begin, daysFrom(series, begin, 7));
  }
  if (freq === 'MONTHLY') {
    const [year, month] = [Math.floor(ordinal / 12), (ordinal % 12) + 1];
    return expand(numberOfDate(year, month, 1), daysOfMonth(series, year, month));
  }
  const days: number[] = [];
  for (let month = 1; month <= 12; month++) days.push(...daysOfMonth(series, ordinal, month));
  return expand(numberOfDate(ordinal, 1, 1), days);
}
