import { z } from 'zod';
import { meterSwap, reviewCode } from './check-in';
import { hours, id, instant, line, pageQuery, text } from './common';

export const READING_SOURCES = [
  'entry',
  'check_in',
  'logged',
  'swap_final',
  'swap_first',
  'closure',
  'correction',
] as const;

/** A reading without an outing. */
export const createReading = z.strictObject({
  id,
  unitId: id,
  hours,
  at: instant.optional(),
  meterSwap: meterSwap.optional(),
  confirmReason: line(500).optional(),
});

export const keptReading = z.object({
  id,
  unitId: id,
  engineHours: z.number(),
  shownHours: z.number(),
  hoursRun: z.number(),
  at: z.string(),
  review: reviewCode.nullable(),
});

export const voidReading = z.strictObject({
  reason: line(500),
  replacement: z.strictObject({ hours }).optional(),
  /** False: the outing that the reading ended never happened, and is voided with it. */
  outingHappened: z.boolean('say true or false').optional(),
});

export const reviewReading = z.strictObject({ note: text(500).optional() });

export const voidedReading = z.object({
  id,
  unitId: id,
  voidedAt: z.string(),
  replacementId: id.nullable(),
  engineHours: z.number(),
  outings: z.int(),
});

export const reviewedReading = z.object({
  id,
  unitId: id,
  reviewedAt: z.string(),
  note: z.string().nullable(),
});

export const readingsQuery = z.object({
  unitId: id.optional(),
  review: z.literal('open', 'is "open" or left out').optional(),
  ...pageQuery,
});

export const reading = z.object({
  id,
  unitId: id,
  fleetNumber: z.string(),
  dockId: id,
  dockName: z.string(),
  timeZone: z.string(),
  at: z.string(),
  source: z.enum(READING_SOURCES),
  engineHours: z.number(),
  shownHours: z.number(),
  /** The reading before it, on whichever meter. */
  previous: z.object({ at: z.string(), engineHours: z.number() }).nullable(),
  outingId: id.nullable(),
  outingStartedAt: z.string().nullable(),
  recordedAt: z.string(),
  recordedBy: z.string().nullable(),
  confirmReason: z.string().nullable(),
  review: reviewCode.nullable(),
  reviewedAt: z.string().nullable(),
  reviewNote: z.string().nullable(),
  voidedAt: z.string().nullable(),
  voidReason: z.string().nullable(),
  replacesReadingId: id.nullable(),
});

export type CreateReading = z.output<typeof createReading>;
export type KeptReading = z.output<typeof keptReading>;
export type VoidReading = z.output<typeof voidReading>;
export type VoidedReading = z.output<typeof voidedReading>;
export type ReviewedReading = z.output<typeof reviewedReading>;
export type ReviewReading = z.output<typeof reviewReading>;
export type ReadingsQuery = z.output<typeof readingsQuery>;
export type Reading = z.output<typeof reading>;
