/** In which order open tasks answer "what do I do next?". */
import type { CalendarDay } from './calendar-day';
import type { DueState } from './due';

/**
 * From the most urgent to the least: it holds its unit; it is overdue; it is under way or planned for today or
 * before; it is due; nobody has planned it; it is planned for a later day.
 */
export const URGENCIES = ['holding', 'overdue', 'today', 'due', 'unplanned', 'later'] as const;
export type Urgency = (typeof URGENCIES)[number];

/** What of an open task decides its urgency. `state` is null when it follows from no rule. */
export type UrgencyFacts = {
  state: DueState | null;
  holdsUnit: boolean;
  started: boolean;
  plannedOn: CalendarDay | null;
  today: CalendarDay;
};

/** The urgency of an open task. Planning does not hide that a unit is held or the work overdue. */
export function computeUrgency({ state, holdsUnit, started, plannedOn, today }: UrgencyFacts): Urgency {
  if (holdsUnit) return 'holding';
  if (state === 'overdue') return 'overdue';
  if (started || (plannedOn !== null && plannedOn <= today)) return 'today';
  if (plannedOn !== null) return 'later';
  return state === 'due' ? 'due' : 'unplanned';
}

/** What two tasks are compared by. */
export type UrgentTask = {
  id: string;
  urgency: Urgency;
  plannedOn: CalendarDay | null;
  openedAt: string;
  fleetNumber: string;
};

/** Orders by urgency, then the day planned (none last), then the one open longer, then fleet number and id. */
export function compareUrgency(a: UrgentTask, b: UrgentTask): number {
  return (
    URGENCIES.indexOf(a.urgency) - URGENCIES.indexOf(b.urgency) ||
    compareText(a.plannedOn ?? '9999-12-31', b.plannedOn ?? '9999-12-31') ||
    compareText(a.openedAt, b.openedAt) ||
    compareText(a.fleetNumber, b.fleetNumber) ||
    compareText(a.id, b.id)
  );
}

function compareText(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}
