import { type CalendarDay, isLeapYear, partsOfDay, type Weekday, weekdayOf } from './calendar-day';

/** When a dock hires out: weekdays, and a season of month-days that may run over the new year; null is all year. */
export type Opening = { season: { from: string; to: string } | null; openWeekdays: readonly Weekday[] };

/**
 * Whether a dock hires out on a day: an open weekday inside the season, both ends included. A season from
 * '11-01' to '03-31' runs over the new year; an end on 29 February is the 28th where that is missing.
 */
export function isOpenOn({ season, openWeekdays }: Opening, day: CalendarDay): boolean {
  if (!openWeekdays.includes(weekdayOf(day))) return false;
  if (!season) return true;
  const monthDay = day.slice(5);
  const [from, to] = [inYearOf(day, season.from), inYearOf(day, season.to)];
  return from <= to ? monthDay >= from && monthDay <= to : monthDay >= from || monthDay <= to;
}

function inYearOf(day: CalendarDay, monthDay: string): string {
  return monthDay === '02-29' && !isLeapYear(partsOfDay(day).year) ? '02-28' : monthDay;
}
