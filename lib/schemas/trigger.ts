import { z } from 'zod';
import { isCalendarDay } from '@/lib/domain/calendar-day';
import { firstOnOrAfter, parseRecurrence } from '@/lib/domain/recurrence';
import { count, day, hours } from './common';

const anchor = z
  .enum(['scheduled', 'completed'], 'is "scheduled" (counted from when it was due) or "completed"')
  .default('scheduled');

const engineHours = z.strictObject({
  on: z.literal('engine_hours'),
  every: hours.refine((value) => value > 0, 'is more than 0 h'),
  first: hours.optional(),
  anchor,
});

const outings = z.strictObject({
  on: z.literal('outings'),
  every: count.refine((value) => value > 0, 'is at least 1 outing'),
  first: count.optional(),
  anchor,
});

const calendar = z
  .strictObject({
    on: z.literal('calendar'),
    rrule: z.string('give a recurrence rule such as FREQ=MONTHLY').max(500, 'is longer than 500 characters'),
    start: day,
    anchor,
  })
  .superRefine((trigger, ctx) => {
    const refuse = (message: string) => ctx.addIssue({ code: 'custom', path: ['rrule'], message });
    const parsed = parseRecurrence(trigger.rrule);
    if (!parsed.ok) refuse(parsed.reason);
    else if (isCalendarDay(trigger.start) && !firstOnOrAfter(parsed.recurrence, trigger.start, trigger.start))
      refuse(`names no day from ${trigger.start} on`);
  });

const trigger = z.discriminatedUnion(
  'on',
  [engineHours, outings, calendar],
  'counts "engine_hours", "outings" or "calendar"',
);

/** One "how often" or several, whichever comes first: hours in decimals, outings whole, the calendar by days. */
export const triggers = z
  .array(trigger, 'give a list of triggers')
  .min(1, 'name at least one: engine hours, outings or the calendar')
  .max(8, 'are at most 8');

export type TriggerShape = z.output<typeof trigger>;
