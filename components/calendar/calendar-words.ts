import type { CalendarView } from '@/lib/domain/calendar-range';
import { partsOfDay, type CalendarDay } from '@/lib/domain/calendar-day';
import { countOf, describeDay, MONTH_NAMES } from '@/lib/domain/words';
import type { CalendarDuty, CalendarEvent } from '@/lib/schemas/calendar';

export const calendarStates: Record<CalendarDuty['state'], string> = {
  overdue: 'Overdue',
  due: 'Due',
  upcoming: 'Upcoming',
  clear: 'Clear',
  open: 'Open',
  closed: 'Closed',
};

export const viewWords: Record<CalendarView, string> = { month: 'Month', week: 'Week', list: 'List' };

/** The heading of what is shown: 'December 2026', 'Week of Mon 30 Nov 2026'. */
export function viewTitle(view: CalendarView, day: CalendarDay, from: CalendarDay): string {
  if (view === 'week') return `Week of ${describeDay(from)}`;
  const { year, month } = partsOfDay(day);
  return `${MONTH_NAMES[month - 1]} ${year}`;
}

/** When a duty is due by each of its triggers: 'due Fri 5 Jun 2026 or at 50.0 h', empty for work without a rule. */
export function dueText({ dueOn, dueAtHours, dueAtOutings }: CalendarDuty): string {
  const places = [
    ...(dueOn === null ? [] : [`on ${describeDay(dueOn)}`]),
    ...(dueAtHours === null ? [] : [`at ${dueAtHours.toFixed(1)} h`]),
    ...(dueAtOutings === null ? [] : [`at outing ${dueAtOutings}`]),
  ];
  return places.length === 0 ? '' : `Due ${places.join(' or ')}`;
}

/** How much of its meters is left: '3.5 h left', '2.0 h past due', empty where it goes by no meter. */
export function leftText({ leftHours, leftOutings }: CalendarDuty): string {
  const parts = [
    ...(leftHours === null ? [] : [side(`${Math.abs(leftHours).toFixed(1)} h`, leftHours)]),
    ...(leftOutings === null ? [] : [side(countOf(Math.abs(leftOutings), 'outing'), leftOutings)]),
  ];
  return parts.join(', ');
}

function side(amount: string, left: number): string {
  return left < 0 ? `${amount} past due` : `${amount} left`;
}

/** Above this many events a day shows counts instead of each event. */
export const COLLAPSE_ABOVE = 500;

/** One line of a day: an event, or how many of one state. */
export type CalendarLine =
  | { kind: 'event'; id: string; on: CalendarDay; event: CalendarEvent }
  | { kind: 'count'; id: string; on: CalendarDay; state: CalendarDuty['state']; count: number };

/** The lines of the calendar: every event, or above COLLAPSE_ABOVE of them one line a day and state. */
export function toLines(events: readonly CalendarEvent[]): CalendarLine[] {
  if (events.length <= COLLAPSE_ABOVE)
    return events.map((event) => ({ kind: 'event', id: event.id, on: event.on, event }));
  const counts = new Map<string, Extract<CalendarLine, { kind: 'count' }>>();
  for (const { on, state } of events) {
    const id = `${on}:${state}`;
    const line = counts.get(id);
    if (line) line.count += 1;
    else counts.set(id, { kind: 'count', id, on, state, count: 1 });
  }
  return [...counts.values()];
}
