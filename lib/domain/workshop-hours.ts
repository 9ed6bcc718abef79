import { type CalendarDay, type Weekday, weekdayOf } from './calendar-day';

/** A mechanic's working minutes on each weekday at one dock (left out: none), and days off, both ends included. */
export type MechanicHours = {
  dockId: string;
  minutes: Partial<{ [weekday in Weekday]: number }>;
  absences: readonly { from: CalendarDay; to: CalendarDay }[];
};

/** Working minutes of a dock's workshop on each of the days, absences taken off. */
export function computeWorkshopMinutes(
  mechanics: readonly MechanicHours[],
  dockId: string,
  days: readonly CalendarDay[],
): number[] {
  const here = mechanics.filter((mechanic) => mechanic.dockId === dockId);
  return days.map((day) => {
    const present = here.filter(({ absences }) => !absences.some(({ from, to }) => from <= day && day <= to));
    return present.reduce((sum, { minutes }) => sum + (minutes[weekdayOf(day)] ?? 0), 0);
  });
}

/** Fewer closed tasks than these do not overrule the plan. */
const FEWEST_CLOSED = 5;
const MOST_CLOSED = 20;

/**
 * How long a task takes: as planned (base, per carburettor, per engine) until five were closed with their minutes,
 * then the median of the last twenty of that rule on units alike, which one that dragged on does not move much.
 */
export function computeTaskMinutes(planned: number, closedMinutes: readonly number[]): number {
  if (closedMinutes.length < FEWEST_CLOSED) return planned;
  const sorted = closedMinutes.slice(-MOST_CLOSED).sort((a, b) => a - b);
  const middle = Math.floor(sorted.length / 2);
  return sorted.length % 2 ? sorted[middle]! : Math.round((sorted[middle - 1]! + sorted[middle]!) / 2);
}
