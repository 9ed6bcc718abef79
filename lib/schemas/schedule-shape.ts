/**
 * Between the API's decimal hours and the domain's whole tenths: the one place for rules, used by the server
 * and by the browser alike.
 */
import type { CalendarDay } from '@/lib/domain/calendar-day';
import type { DuePoint } from '@/lib/domain/due';
import type { Schedule, Trigger } from '@/lib/domain/rule';
import type { Due, ScheduleShape } from './rule';
import type { TriggerShape } from './trigger';

/** Decimal hours as whole tenths: 1472.7 is 14727. The schema has refused a second decimal place. */
export const toTenths = (hours: number): number => Math.round(hours * 10);
/** Whole tenths as decimal hours: 14727 is 1472.7. */
export const toHours = (tenths: number): number => tenths / 10;

/** A schedule as the domain computes with it. */
export function toSchedule({ triggers, lead, window }: ScheduleShape): Schedule {
  return {
    triggers: triggers.map(toTrigger),
    lead: { tenths: toTenths(lead.hours), outings: lead.outings, days: lead.days },
    window: {
      earlyTenths: toTenths(window.earlyHours),
      lateTenths: toTenths(window.lateHours),
      earlyOutings: window.earlyOutings,
      lateOutings: window.lateOutings,
      earlyDays: window.earlyDays,
      lateDays: window.lateDays,
    },
  };
}

/** A schedule as the API shows it. */
export function fromSchedule({ triggers, lead, window }: Schedule): ScheduleShape {
  return {
    triggers: triggers.map(fromTrigger),
    lead: { hours: toHours(lead.tenths), outings: lead.outings, days: lead.days },
    window: {
      earlyHours: toHours(window.earlyTenths),
      lateHours: toHours(window.lateTenths),
      earlyOutings: window.earlyOutings,
      lateOutings: window.lateOutings,
      earlyDays: window.earlyDays,
      lateDays: window.lateDays,
    },
  };
}

function toTrigger(trigger: TriggerShape): Trigger {
  if (trigger.on !== 'engine_hours') return trigger;
  const { every, first, ...rest } = trigger;
  return { ...rest, every: toTenths(every), ...(first !== undefined && { first: toTenths(first) }) };
}

function fromTrigger(trigger: Trigger): TriggerShape {
  if (trigger.on === 'calendar') return trigger;
  const { every, first, anchor } = trigger;
  if (trigger.on === 'outings') return { ...trigger, on: 'outings' };
  return {
    on: 'engine_hours',
    every: toHours(every),
    ...(first !== undefined && { first: toHours(first) }),
    anchor,
  };
}

/** Where a due point is, as the API shows it: `{hours}`, `{outings}` or `{date}`. */
export function fromDuePoint(point: DuePoint): Due {
  switch (point.on) {
    case 'engine_hours':
      return { hours: toHours(point.dueTenths) };
    case 'outings':
      return { outings: point.dueOutings };
    case 'calendar':
      return { date: point.dueOn };
  }
}

/** A further due point of a trigger, as the API shows it. */
export function fromFollowing(on: Trigger['on'], at: number | CalendarDay): Due {
  if (typeof at === 'string') return { date: at };
  return on === 'outings' ? { outings: at } : { hours: toHours(at) };
}
