/**
 * Calendar days: dates without a time of day, as 'YYYY-MM-DD' strings end to end.
 *
 * Arithmetic runs on day numbers (whole days since 1970-01-01) by the proleptic Gregorian calendar and
 * never through a local `Date`, so no result depends on the time zone of the process.
 */

/** A day of the calendar as 'YYYY-MM-DD', from 1900 (an earlier year is a slip of the pen) to 9999. */
export type CalendarDay = string;

/** A weekday as RFC 5545 writes it. */
export type Weekday = 'MO' | 'TU' | 'WE' | 'TH' | 'FR' | 'SA' | 'SU';

/** Monday first; the index is the number of days after Monday. */
export const WEEKDAYS: readonly Weekday[] = ['MO', 'TU', 'WE', 'TH', 'FR', 'SA', 'SU'];

/** A day taken apart: month 1 to 12, day of the month from 1. */
export type DateParts = { year: number; month: number; day: number };

const LENGTHS = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
const SHAPE = /^\d{4}-\d{2}-\d{2}$/;

/** Whether a Gregorian year has 366 days. */
export function isLeapYear(year: number): boolean {
  return year % 4 === 0 && (year % 100 !== 0 || year % 400 === 0);
}

/** Days in a month of a year; month 1 to 12. */
export function daysInMonth(year: number, month: number): number {
  return month === 2 && isLeapYear(year) ? 29 : LENGTHS[month - 1]!;
}

/** Whether a value is a real day written 'YYYY-MM-DD': '2023-02-29' is not, nor is '2023-2-1'. */
export function isCalendarDay(value: unknown): value is CalendarDay {
  if (typeof value !== 'string' || !SHAPE.test(value)) return false;
  const { year, month, day } = split(value);
  return year >= 1900 && month >= 1 && month <= 12 && day >= 1 && day <= daysInMonth(year, month);
}

function split(day: CalendarDay): DateParts {
  return { year: +day.slice(0, 4), month: +day.slice(5, 7), day: +day.slice(8, 10) };
}

/** The parts of a day. Throws RangeError when it is not a real calendar day. */
export function partsOfDay(day: CalendarDay): DateParts {
  if (!isCalendarDay(day)) throw new RangeError(`not a calendar day: ${JSON.stringify(day)}`);
  return split(day);
}

/** Days since 1970-01-01 of a date whose month is 1 to 12; the day may run past either end of its month. */
export function numberOfDate(year: number, month: number, day: number): number {
  const shifted = month <= 2 ? year - 1 : year;
  const era = Math.floor(shifted / 400);
  const yearOfEra = shifted - era * 400;
  const dayOfYear = Math.floor((153 * (month + (month > 2 ? -3 : 9)) + 2) / 5) + day - 1;
  const leapDays = Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100);
  return era * 146097 + yearOfEra * 365 + leapDays + dayOfYear - 719468;
}

/** Days since 1970-01-01. Throws RangeError when the day is not real. */
export function numberOfDay(day: CalendarDay): number {
  const { year, month, day: ofMonth } = partsOfDay(day);
  return numberOfDate(year, month, ofMonth);
}

/** The date of a day number. */
export function partsOfNumber(number: number): DateParts {
  const shifted = number + 719468;
  const era = Math.floor(shifted / 146097);
  const dayOfEra = shifted - era * 146097;
  const yearOfEra = Math.floor(
    (dayOfEra - Math.floor(dayOfEra / 1460) + Math.floor(dayOfEra / 36524) - Math.floor(dayOfEra / 146096)) /
      365,
  );
  const dayOfYear = dayOfEra - (365 * yearOfEra + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100));
  const fromMarch = Math.floor((5 * dayOfYear + 2) / 153);
  const month = fromMarch < 10 ? fromMarch + 3 : fromMarch - 9;
  const day = dayOfYear - Math.floor((153 * fromMarch + 2) / 5) + 1;
  return { year: yearOfEra + era * 400 + (month <= 2 ? 1 : 0), month, day };
}

const padded = (value: number, width: number) => String(value).padStart(width, '0');

/** The day of a day number. Throws RangeError outside the years 1000 to 9999. */
export function dayOfNumber(number: number): CalendarDay {
  const { year, month, day } = partsOfNumber(number);
  if (!(year >= 1000 && year <= 9999)) throw new RangeError(`day number ${number} is outside 1000 to 9999`);
  return `${year}-${padded(month, 2)}-${padded(day, 2)}`;
}

/** The day `days` later (earlier when negative). `addDays('2024-02-28', 1)` is '2024-02-29'. */
export function addDays(day: CalendarDay, days: number): CalendarDay {
  return dayOfNumber(numberOfDay(day) + days);
}

/** Whole days from one day to another: positive when `to` is later. */
export function daysBetween(from: CalendarDay, to: CalendarDay): number {
  return numberOfDay(to) - numberOfDay(from);
}

/** Days after Monday of a day number; 1970-01-01 was a Thursday. */
export function weekdayIndex(number: number): number {
  return (((number + 3) % 7) + 7) % 7;
}

/** The weekday of a day. `weekdayOf('2024-02-29')` is 'TH'. */
export function weekdayOf(day: CalendarDay): Weekday {
  return WEEKDAYS[weekdayIndex(numberOfDay(day))]!;
}

const formatters = new Map<string, Intl.DateTimeFormat>();

function formatterOf(timeZone: string): Intl.DateTimeFormat {
  let formatter = formatters.get(timeZone);
  if (!formatter) {
    formatter = new Intl.DateTimeFormat('en-US', {
      timeZone,
      calendar: 'gregory',
      numberingSystem: 'latn',
      year: 'numeric',
      month: 'numeric',
      day: 'numeric',
    });
    formatters.set(timeZone, formatter);
  }
  return formatter;
}

/** Whether a text names a time zone this machine knows, such as 'America/New_York'. */
export function isTimeZone(timeZone: string): boolean {
  try {
    formatterOf(timeZone);
    return true;
  } catch {
    return false;
  }
}

/** The calendar day an instant falls on in an IANA time zone. Throws RangeError for an unknown zone. */
export function localDay(instant: Date, timeZone: string): CalendarDay {
  const parts = { year: 0, month: 0, day: 0 };
  for (const { type, value } of formatterOf(timeZone).formatToParts(instant)) {
    if (type === 'year' || type === 'month' || type === 'day') parts[type] = +value;
  }
  return `${padded(parts.year, 4)}-${padded(parts.month, 2)}-${padded(parts.day, 2)}`;
}

/**
 * The first instant of a calendar day in an IANA time zone, to the second: 23 to 25 hours before the next
 * where the clock changes, and later than midnight where midnight itself is skipped. For a day a zone left
 * out altogether, the start of the day after it.
 */
export function startOfLocalDay(day: CalendarDay, timeZone: string): Date {
  const midnight = numberOfDay(day) * 86_400;
  let before = midnight - 30 * 3600;
  let from = midnight + 30 * 3600;
  while (from - before > 1) {
    const middle = Math.floor((before + from) / 2);
    if (localDay(new Date(middle * 1000), timeZone) >= day) from = middle;
    else before = middle;
  }
  return new Date(from * 1000);
}
