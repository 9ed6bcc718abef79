import { z } from 'zod';
import { flag, id, line, pageQuery } from './common';

/** A whole number of parts, at least 1. */
export const quantity = z
  .int('give a whole number')
  .min(1, 'is at least 1')
  .max(100_000, 'cannot be above 100,000');

const contents = z
  .array(z.strictObject({ partId: id, quantity }), 'give the parts of the kit')
  .max(100, 'are at most 100')
  .superRefine((list, ctx) =>
    list.forEach(({ partId }, index) => {
      if (list.slice(0, index).some((other) => other.partId === partId))
        ctx.addIssue({ code: 'custom', path: [index, 'partId'], message: 'is named above already' });
    }),
  );

const fields = { number: line(40), name: line(120), supplier: line(120).nullable() };

/** `contents` makes it a kit; a kit of nothing yet is one too. */
export const createPart = z.strictObject({
  id,
  ...fields,
  supplier: fields.supplier.optional(),
  contents: contents.optional(),
});

/** Only what is named changes; `contents` are put in place of what the kit held. */
export const changePart = z
  .strictObject({ ...fields, contents })
  .partial()
  .refine((input) => Object.keys(input).length > 0, 'names nothing to change');

export const partsQuery = z.object({
  dockId: id.optional(),
  low: flag,
  retired: flag,
  ...pageQuery,
});

/** Where a page of parts ended. */
export const partPlace = z.object({ low: z.boolean(), name: z.string(), id: z.uuid() });

/** What lies at one dock of one part. `free` is what is set aside for no task, `low` whether that reaches its mark. */
export const level = z.object({
  dockId: id,
  dockName: z.string(),
  onHand: z.int(),
  reserved: z.int(),
  free: z.int(),
  lowAt: z.int().nullable(),
  low: z.boolean(),
});

/** A part in a list, with what lies of it at the docks one works at. */
export const partLine = z.object({
  id,
  number: z.string(),
  name: z.string(),
  supplier: z.string().nullable(),
  isKit: z.boolean(),
  low: z.boolean(),
  levels: z.array(level),
  retiredAt: z.string().nullable(),
});

export const part = partLine.extend({
  /** What a kit holds; empty for a part that is none. */
  contents: z.array(z.object({ partId: id, number: z.string(), name: z.string(), quantity: z.int() })),
  inKits: z.array(z.object({ id, name: z.string(), quantity: z.int() })),
  rules: z.array(
    z.object({
      id,
      name: z.string(),
      quantity: z.int(),
      per: z.enum(['unit', 'engine', 'cylinder', 'carb']),
    }),
  ),
  reservedFor: z.array(
    z.object({
      taskId: id,
      title: z.string(),
      fleetNumber: z.string(),
      dockName: z.string(),
      quantity: z.int(),
    }),
  ),
});

export type CreatePart = z.output<typeof createPart>;
export type ChangePart = z.output<typeof changePart>;
export type PartsQuery = z.output<typeof partsQuery>;
export type PartLevel = z.output<typeof level>;
export type PartLine = z.output<typeof partLine>;
export type Part = z.output<typeof part>;
