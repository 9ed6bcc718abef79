import { type CalendarDay, startOfLocalDay } from './calendar-day';

const MINUTE = 60_000;

/** The minutes past midnight that a clock in the time zone shows. */
export function localMinutes(instant: Date, timeZone: string): number {
  const clock = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  }).format(instant);
  return Number(clock.slice(0, 2)) * 60 + Number(clock.slice(3, 5));
}

/**
 * The instant at which a clock in the time zone shows so many minutes past midnight of a day: the earlier one where
 * the clock goes back over it, as much later where it leaps over it. 14:30 is 870.
 */
export function localInstant(day: CalendarDay, minutes: number, timeZone: string): Date {
  const start = startOfLocalDay(day, timeZone).getTime();
  const first = localMinutes(new Date(start), timeZone);
  const guess = new Date(start + (minutes - first) * MINUTE);
  const off = minutes - localMinutes(guess, timeZone);
  if (off === 0) return guess;
  const corrected = new Date(guess.getTime() + off * MINUTE);
  return localMinutes(corrected, timeZone) === minutes ? corrected : guess;
}
