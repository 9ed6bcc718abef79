import { type CalendarDay, localDay } from './calendar-day';

const formatters = new Map<string, Intl.DateTimeFormat>();

function formatterOf(timeZone: string): Intl.DateTimeFormat {
  let formatter = formatters.get(timeZone);
  if (!formatter) {
    formatter = new Intl.DateTimeFormat('en-GB', {
      timeZone,
      hour: '2-digit',
      minute: '2-digit',
      hourCycle: 'h23',
    });
    formatters.set(timeZone, formatter);
  }
  return formatter;
}

/** What a clock on the wall shows at an instant in an IANA time zone, as 'HH:MM' from 00:00 to 23:59. */
export function wallTime(instant: Date, timeZone: string): string {
  return formatterOf(timeZone).format(instant);
}

/** Whether at an instant it is `time` ('HH:MM') of the local day, or later: also on a later day. */
export function hasReached(instant: Date, day: CalendarDay, time: string, timeZone: string): boolean {
  const today = localDay(instant, timeZone);
  return today > day || (today === day && wallTime(instant, timeZone) >= time);
}
