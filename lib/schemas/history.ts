import { z } from 'zod';
import { reviewCode } from './check-in';
import { id, pageQuery } from './common';
import { READING_SOURCES } from './reading';

export const HISTORY_KINDS = ['outing', 'reading', 'meter_swap', 'closure', 'defect', 'lay_up'] as const;

export const historyQuery = z.object({
  kind: z.enum(HISTORY_KINDS, `is one of ${HISTORY_KINDS.join(', ')}`).optional(),
  ...pageQuery,
});

/** Where a page of a history ended: instants to the microsecond, as the database keeps them. */
export const historyPlace = z.object({
  at: z.string().regex(/^\d{4,6}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{6}Z$/),
  rank: z.int().min(0).max(9),
  id: z.uuid(),
});

const voided = {
  voidedAt: z.string().nullable(),
  voidedBy: z.string().nullable(),
  voidReason: z.string().nullable(),
};
const entry = { id, at: z.string() };

export const historyEntry = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('outing'),
    ...entry,
    dockName: z.string(),
    startedAt: z.string().nullable(),
    endedAt: z.string().nullable(),
    checkedOutBy: z.string().nullable(),
    checkedInBy: z.string().nullable(),
    /** The reading taken when it came back. */
    readingId: id.nullable(),
    engineHours: z.number().nullable(),
    ...voided,
  }),
  z.object({
    kind: z.literal('reading'),
    ...entry,
    source: z.enum(READING_SOURCES),
    engineHours: z.number(),
    shownHours: z.number(),
    confirmReason: z.string().nullable(),
    review: reviewCode.nullable(),
    reviewedAt: z.string().nullable(),
    recordedBy: z.string().nullable(),
    replacesReadingId: id.nullable(),
    outingId: id.nullable(),
    ...voided,
  }),
  z.object({
    kind: z.literal('meter_swap'),
    /** The id of the old meter's last reading, which voids both. */
    ...entry,
    engineHours: z.number(),
    oldFinal: z.number(),
    newFirst: z.number().nullable(),
    recordedBy: z.string().nullable(),
    ...voided,
  }),
  z.object({
    kind: z.literal('closure'),
    ...entry,
    taskId: id,
    taskKind: z.enum(['inspection', 'service', 'rebuild', 'repair']),
    title: z.string(),
    engineHours: z.number(),
    outings: z.int(),
    note: z.string().nullable(),
    closedBy: z.string().nullable(),
    reversedAt: z.string().nullable(),
    reversedBy: z.string().nullable(),
    reverseReason: z.string().nullable(),
  }),
  z.object({
    kind: z.literal('defect'),
    ...entry,
    title: z.string(),
    detail: z.string().nullable(),
    holdsUnit: z.boolean(),
    reportedBy: z.string().nullable(),
    clearedAt: z.string().nullable(),
    clearedBy: z.string().nullable(),
    clearNote: z.string().nullable(),
  }),
  z.object({
    kind: z.literal('lay_up'),
    ...entry,
    fromOn: z.string(),
    untilOn: z.string().nullable(),
    reason: z.string(),
    recordedBy: z.string().nullable(),
    endedAt: z.string().nullable(),
  }),
]);

export type HistoryKind = (typeof HISTORY_KINDS)[number];
export type HistoryQuery = z.output<typeof historyQuery>;
export type HistoryEntry = z.output<typeof historyEntry>;
