import { z } from 'zod';
import { flag, id, line, text } from './common';

export const createDefect = z.strictObject({
  /** Made by the client, so that sending it again writes nothing; left out, one is made here. */
  id: id.optional(),
  unitId: id,
  title: line(120),
  detail: text(2000).optional(),
  holdsUnit: z.boolean('say true or false'),
});

export const clearDefect = z.strictObject({ note: line(1000) });

export const defectsQuery = z.object({ unitId: id.optional(), open: flag });

export const defect = z.object({
  id,
  unitId: id,
  fleetNumber: z.string(),
  title: z.string(),
  detail: z.string().nullable(),
  holdsUnit: z.boolean(),
  reportedAt: z.string(),
  reportedBy: z.string().nullable(),
  readingId: id.nullable(),
  clearedAt: z.string().nullable(),
  clearedBy: z.string().nullable(),
  clearNote: z.string().nullable(),
});

export type CreateDefect = z.output<typeof createDefect>;
export type ClearDefect = z.output<typeof clearDefect>;
export type DefectsQuery = z.output<typeof defectsQuery>;
export type Defect = z.output<typeof defect>;
