import { z } from 'zod';
import { hours, id, instant, line } from './common';

export const createCheckOut = z.strictObject({
  id,
  unitId: id,
  dockId: id.optional(),
  at: instant.optional(),
  dueBackAt: instant.optional(),
  plannedHours: hours.optional(),
  renterReference: line(80).optional(),
});

export const checkOut = z.object({
  id,
  unitId: id,
  dockId: id,
  at: z.string(),
  dueBackAt: z.string().nullable(),
  plannedHours: z.number().nullable(),
  renterReference: z.string().nullable(),
});

export type CreateCheckOut = z.output<typeof createCheckOut>;
export type CheckOut = z.output<typeof checkOut>;
