import { z } from 'zod';
import { count, day, hours, id, line, pageQuery } from './common';
import { specs } from './model';

const carbCount = z.int('give a whole number').min(0, 'cannot be below 0').max(16, 'cannot be above 16');

export const createUnit = z.strictObject({
  fleetNumber: line(20),
  modelId: id,
  dockId: id,
  hin: line(30).optional(),
  registration: line(20).optional(),
  enteredServiceOn: day,
  engineHours: hours,
  outings: count.optional(),
  carbCount: carbCount.optional(),
});

/** Only what is named changes; null takes an optional field away. */
export const changeUnit = z
  .strictObject({
    fleetNumber: line(20),
    modelId: id,
    dockId: id,
    hin: line(30).nullable(),
    registration: line(20).nullable(),
    enteredServiceOn: day,
    carbCount: carbCount.nullable(),
    /** Limits of its own, in place of its model's by name and, within a name, by field; the whole of them. */
    specs,
    retired: z.literal(true, 'a unit is retired for good: send true or leave it out'),
  })
  .partial()
  .refine((input) => Object.keys(input).length > 0, 'names nothing to change');

export const unitsQuery = z.object({ dockId: id.optional(), ...pageQuery });

/** Where a page of units ended. */
export const unitPlace = z.object({ fleetNumber: z.string(), id: z.uuid() });

export const unit = z.object({
  id,
  fleetNumber: z.string(),
  modelId: id,
  modelName: z.string(),
  dockId: id,
  dockName: z.string(),
  hin: z.string().nullable(),
  registration: z.string().nullable(),
  enteredServiceOn: z.string(),
  engineHours: z.number(),
  outings: z.int(),
  carbCount: z.int(),
  specs,
  readAt: z.string(),
  retiredAt: z.string().nullable(),
});

export type CreateUnit = z.output<typeof createUnit>;
export type ChangeUnit = z.output<typeof changeUnit>;
export type UnitsQuery = z.output<typeof unitsQuery>;
export type Unit = z.output<typeof unit>;
