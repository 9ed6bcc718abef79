import { z } from 'zod';
import { daysBetween, isCalendarDay } from '@/lib/domain/calendar-day';
import { day, id } from './common';
import { TASK_KINDS } from './task';

/** The longest stretch that is asked for at once: a quarter, whole weeks on either side. */
export const MAX_CALENDAR_DAYS = 93;

export const calendarQuery = z
  .object({ from: day, to: day, dockId: id.optional() })
  .superRefine(({ from, to }, ctx) => {
    if (!isCalendarDay(from) || !isCalendarDay(to)) return;
    const days = daysBetween(from, to) + 1;
    if (days < 1) ctx.addIssue({ code: 'custom', path: ['to'], message: 'is before from' });
    if (days > MAX_CALENDAR_DAYS)
      ctx.addIssue({
        code: 'custom',
        path: ['to'],
        message: `is too far: ask for at most ${MAX_CALENDAR_DAYS} days`,
      });
  });

/** A duty or a task without the day it stands on. `open` is a task that follows from no rule. */
const calendarDuty = z.object({
  /** The task's id, the closure's for a closed one, or unit and rule where no task is open. */
  id: z.string(),
  kind: z.enum(['task', 'due', 'forecast']),
  unitId: id,
  ruleId: id.nullable(),
  taskId: id.nullable(),
  title: z.string(),
  state: z.enum(['clear', 'upcoming', 'due', 'overdue', 'open', 'closed']),
  dueOn: z.string().nullable(),
  dueAtHours: z.number().nullable(),
  dueAtOutings: z.int().nullable(),
  /** The first and the last day on which a calendar duty counts as done on schedule. */
  earliest: z.string().optional(),
  latest: z.string().optional(),
  fleetNumber: z.string(),
  dockId: id,
  taskKind: z.enum(TASK_KINDS),
  plannedOn: z.string().nullable(),
  holdsUnit: z.boolean(),
  started: z.boolean(),
  /** The task's revision, to change it against. */
  revision: z.int().nullable(),
  /** Hours and outings until due, on the nearest trigger of each kind; negative when past. */
  leftHours: z.number().nullable(),
  leftOutings: z.number().nullable(),
});

export const calendarEvent = calendarDuty.extend({ on: z.string() });

export const calendar = z.object({
  events: z.array(calendarEvent),
  /** Work without a day, the nearest first; at most UNDATED_LIMIT of those without a task. */
  undated: z.array(calendarDuty),
  freshAsOf: z.string(),
});

export type CalendarQuery = z.output<typeof calendarQuery>;
export type CalendarDuty = z.output<typeof calendarDuty>;
export type CalendarEvent = z.output<typeof calendarEvent>;
export type Calendar = z.output<typeof calendar>;
