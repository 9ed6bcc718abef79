import { z } from 'zod';
import { isCalendarDay, weekdayOf } from '@/lib/domain/calendar-day';
import { day } from './common';

export const digestQuery = z.strictObject({
  weekOn: day
    .refine((value) => !isCalendarDay(value) || weekdayOf(value) === 'MO', 'is not a Monday')
    .optional(),
});

export const unsubscribeParams = z.object({ key: z.uuid('is not a key of ours') });

export const digestPreview = z.object({
  weekOn: z.string(),
  wanted: z.boolean(),
  subject: z.string(),
  html: z.string(),
  text: z.string(),
  totals: z.object({
    overdue: z.int(),
    held: z.int(),
    daysLost: z.int(),
    due: z.int(),
    closed: z.int(),
  }),
});

/** `mailboxUrl` is where a development set-up keeps its mail, null elsewhere. */
export const digestSending = z.object({
  mailId: z.uuid(),
  to: z.string(),
  mailboxUrl: z.string().nullable(),
});

export type DigestQuery = z.output<typeof digestQuery>;
export type DigestPreview = z.output<typeof digestPreview>;
export type DigestSending = z.output<typeof digestSending>;
