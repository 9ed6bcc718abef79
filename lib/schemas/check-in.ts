import { z } from 'zod';
import { hours, id, instant, line, text } from './common';

/** A new meter was fitted: the old one's final reading and the new one's first. */
export const meterSwap = z.strictObject({ oldFinal: hours, newFirst: hours });

export const createCheckIn = z.strictObject({
  id,
  unitId: id,
  /** What the meter shows now; after a swap, the new meter. */
  hours,
  at: instant.optional(),
  meterSwap: meterSwap.optional(),
  confirmReason: line(500).optional(),
  defect: z
    .strictObject({
      title: line(120),
      detail: text(2000).optional(),
      holdsUnit: z.boolean('say true or false'),
    })
    .optional(),
});

export const reviewCode = z.enum(['unusual_jump', 'late_arrival']);

export const checkIn = z.object({
  id,
  unitId: id,
  engineHours: z.number(),
  shownHours: z.number(),
  hoursRun: z.number(),
  outings: z.int(),
  outingId: id,
  at: z.string(),
  defectId: id.nullable(),
  review: reviewCode.nullable(),
});

export type CreateCheckIn = z.output<typeof createCheckIn>;
export type CheckIn = z.output<typeof checkIn>;
