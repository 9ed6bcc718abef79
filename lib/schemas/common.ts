import { z } from 'zod';
import { isCalendarDay } from '@/lib/domain/calendar-day';

/** Decimal engine hours with at most one place, as a meter shows them. */
export const hours = z
  .number('give engine hours as a number')
  .min(0, 'cannot be below 0 h')
  .max(99_999.9, 'cannot be above 99,999.9 h')
  .refine((value) => Math.abs(value * 10 - Math.round(value * 10)) < 1e-6, 'has more than one decimal place');

/** A whole count of outings. */
export const count = z.int('give a whole number').min(0, 'cannot be below 0').max(1_000_000, 'is too many');

/** A day that exists, as YYYY-MM-DD. */
export const day = z
  .string('give a day as YYYY-MM-DD')
  .refine(isCalendarDay, 'is not a day that exists (YYYY-MM-DD)');

/** An instant with its offset, after RFC 3339; parsed to a Date. */
export const instant = z.iso
  .datetime({ offset: true, error: 'is not an instant (RFC 3339, with its offset)' })
  .transform((text) => new Date(text));

/** A UUID, in the lower case the database answers with. */
export const id = z.uuid('is not an id (a UUID)').toLowerCase();

/** Line breaks and tabs are text; the other control characters are not, and the database keeps no NUL. */
const CONTROLS = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f]/;

/** One line of text that says something. */
export const line = (max: number) =>
  z
    .string('give text')
    .trim()
    .min(1, 'is empty')
    .max(max, `is longer than ${max} characters`)
    .refine((value) => !/[\u0000-\u001f\u007f]/.test(value), 'has a line break or a control character');

/** Free text, possibly several lines. */
export const text = (max: number) =>
  z
    .string('give text')
    .trim()
    .max(max, `is longer than ${max} characters`)
    .refine((value) => !CONTROLS.test(value), 'has a control character');

export const idParams = z.object({ id });

/** A flag in a query: `open=true` or `open=false`. */
export const flag = z
  .enum(['true', 'false'], 'is true or false')
  .transform((value) => value === 'true')
  .optional();

/** How a list is asked for in pages. */
export const pageQuery = {
  cursor: z.string().max(500).optional(),
  limit: z.coerce.number().pipe(z.int().min(1).max(500)).optional(),
};

/** What a list answers. */
export const listOf = <T extends z.ZodType>(item: T) =>
  z.object({ items: z.array(item), nextCursor: z.string().nullable() });
