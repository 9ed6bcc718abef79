import { localDay } from './calendar-day';
import { describeDay } from './words';

const clocks = new Map<string, Intl.DateTimeFormat>();

/** An instant as a clock at the dock shows it, with its weekday: 'Tue 2 Jun 2026, 16:05'. */
export function describeMoment(at: Date, timeZone: string): string {
  let clock = clocks.get(timeZone);
  if (!clock) {
    clock = new Intl.DateTimeFormat('en-GB', {
      timeZone,
      hour: '2-digit',
      minute: '2-digit',
      hourCycle: 'h23',
    });
    clocks.set(timeZone, clock);
  }
  return `${describeDay(localDay(at, timeZone))}, ${clock.format(at)}`;
}
