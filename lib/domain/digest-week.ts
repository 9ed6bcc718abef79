import { addDays, type CalendarDay, localDay, numberOfDay, weekdayIndex } from './calendar-day';
import { hasReached } from './local-time';

/** From when on Monday a digest is sent, by the clock of each dock. */
const SENT_FROM = '06:00';

/** The Monday on or before a day. `mondayOf('2026-12-06')`, a Sunday, is '2026-11-30'. */
export function mondayOf(day: CalendarDay): CalendarDay {
  return addDays(day, -weekdayIndex(numberOfDay(day)));
}

/**
 * The Monday whose digest is to be sent now to somebody with docks in these time zones, or null. It is sent once
 * it is 06:00 on Monday at the last of their docks, and until Tuesday ends at the first: a worker that was down on
 * Monday makes up for it, but nobody gets last week's news on a Wednesday.
 */
export function digestWeekToSend(timeZones: readonly string[], now: Date): CalendarDay | null {
  const weeks = timeZones.map((timeZone) => {
    const today = localDay(now, timeZone);
    const monday = mondayOf(today);
    return today <= addDays(monday, 1) && hasReached(now, monday, SENT_FROM, timeZone) ? monday : null;
  });
  // Time zones lie less than 27 hours apart: docks that are all on a Monday or Tuesday are so in the same week.
  return weeks.every((week) => week !== null) ? (weeks[0] ?? null) : null;
}

/** The Monday of the week that it is at the last of these docks to begin it. */
export function currentWeek(timeZones: readonly string[], now: Date): CalendarDay {
  const days = timeZones.map((timeZone) => localDay(now, timeZone)).sort();
  return mondayOf(days[0] ?? localDay(now, 'UTC'));
}
