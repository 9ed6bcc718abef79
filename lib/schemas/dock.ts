import { z } from 'zod';
import { isCalendarDay } from '@/lib/domain/calendar-day';
import { id, line } from './common';

const WEEKDAYS = ['MO', 'TU', 'WE', 'TH', 'FR', 'SA', 'SU'] as const;

const timeZone = z
  .string('give an IANA time zone')
  .refine(isTimeZone, 'is not an IANA time zone, such as Europe/Lisbon');

/** A day of any year; 29 February is one, and falls back to the 28th where it is missing. */
const monthDay = z
  .string('give a day as MM-DD')
  .refine((text) => isCalendarDay(`2000-${text}`), 'is not a day of the year (MM-DD)');

const season = z.strictObject({ from: monthDay, to: monthDay });
const openWeekdays = z.array(z.enum(WEEKDAYS)).min(1, 'name at least one weekday').max(7);

export const createDock = z.strictObject({
  name: line(80),
  timeZone,
  season: season.optional(),
  openWeekdays: openWeekdays.optional(),
  craftNumbers: z.enum(['us', 'other']).optional(),
});

/** Only what is named changes; a season of null is no season: open all year. */
export const changeDock = z
  .strictObject({
    name: line(80),
    timeZone,
    season: season.nullable(),
    openWeekdays,
    craftNumbers: z.enum(['us', 'other']),
  })
  .partial()
  .refine((input) => Object.keys(input).length > 0, 'names nothing to change');

export const dock = z.object({
  id,
  name: z.string(),
  timeZone: z.string(),
  season: z.object({ from: z.string(), to: z.string() }).nullable(),
  openWeekdays: z.array(z.enum(WEEKDAYS)),
  craftNumbers: z.enum(['us', 'other']),
});

export type ChangeDock = z.output<typeof changeDock>;
export type CreateDock = z.output<typeof createDock>;
export type Dock = z.output<typeof dock>;

function isTimeZone(text: string): boolean {
  if (!/^[A-Za-z]+(?:[/_+-][A-Za-z0-9]+)*$/.test(text)) return false;
  try {
    new Intl.DateTimeFormat('en', { timeZone: text });
    return true;
  } catch {
    return false;
  }
}
