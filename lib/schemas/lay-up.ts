import { z } from 'zod';
import { day, flag, id, line } from './common';

export const createLayUp = z
  .strictObject({ unitId: id, fromOn: day, untilOn: day.optional(), reason: line(300) })
  .refine(({ fromOn, untilOn }) => !untilOn || untilOn >= fromOn, {
    path: ['untilOn'],
    message: 'is before the first day',
  });

export const layUpsQuery = z.object({ unitId: id.optional(), open: flag });

export const layUp = z.object({
  id,
  unitId: id,
  fleetNumber: z.string(),
  fromOn: z.string(),
  /** The last day, or null: until somebody ends it. */
  untilOn: z.string().nullable(),
  reason: z.string(),
  recordedAt: z.string(),
  recordedBy: z.string().nullable(),
  endedAt: z.string().nullable(),
});

export type CreateLayUp = z.output<typeof createLayUp>;
export type LayUpsQuery = z.output<typeof layUpsQuery>;
export type LayUp = z.output<typeof layUp>;
