import { z } from 'zod';
import { MEASURED_UNITS } from '@/lib/domain/measured-value';
import type { Judgement, Specs } from '@/lib/domain/measurement';
import type { EntryValue, OnlyPlace, Step } from '@/lib/domain/procedure';
import type { UnitCounts } from '@/lib/domain/rule';
import { id, instant, line, text } from './common';

const STAGES = ['found', 'left'] as const;
const remark = text(500).optional();

const entryInput = z.discriminatedUnion(
  'kind',
  [
    z.strictObject({
      kind: z.literal('check'),
      outcome: z.enum(['pass', 'fail', 'not_applicable'], 'is pass, fail or not_applicable'),
      note: remark,
    }),
    z.strictObject({
      kind: z.literal('measurement'),
      runs: z
        .array(
          z.strictObject({
            typed: line(40),
            unit: z.enum(MEASURED_UNITS, 'is no unit of measure known here').optional(),
          }),
        )
        .min(1, 'give at least one run')
        .max(12, 'are at most 12'),
      note: remark,
    }),
    z.strictObject({ kind: z.literal('note'), text: text(4000).min(1, 'is empty') }),
    z.strictObject({
      kind: z.literal('photo'),
      attachmentIds: z.array(id).min(1, 'names no picture').max(20, 'are at most 20'),
    }),
    z.strictObject({ kind: z.literal('cleared') }),
  ],
  { error: 'is check, measurement, note, photo or cleared' },
);

const at = {
  stepKey: line(60),
  place: z.int('give a whole number').min(0, 'cannot be below 0').max(200, 'is too large').default(0),
  stage: z.enum(STAGES, 'is found or left').optional(),
  value: entryInput,
};

/** One result of one step. `followsId` is the entry that stood there when this one was written. */
export const recordEntry = z.strictObject({
  id,
  ...at,
  followsId: id.nullable().optional(),
  at: instant.optional(),
});

/** A result given with the closing. */
export const closingResult = z.strictObject(at);

/** The follow-up of a step that failed, at its place. `id` is of the caller's making. */
export const openFollowUp = z.strictObject({
  id,
  stepKey: line(60),
  place: at.place,
});

export const signOffParams = z.object({ id, signOffId: id });

export const signOffTask = z.strictObject({
  id,
  kind: z.enum(['second_person', 'test_ride'], 'is second_person or test_ride'),
  note: text(500).optional(),
});

const named = z.object({ id, name: z.string() }).nullable();
const entryValue = z.custom<EntryValue>((value) => typeof value === 'object' && value !== null);
const judgement = z.custom<Judgement>((value) => typeof value === 'object' && value !== null);

export const entry = z.object({
  id,
  stepKey: z.string(),
  place: z.int(),
  stage: z.enum(STAGES).nullable(),
  value: entryValue,
  judged: judgement.nullable(),
  followsId: id.nullable(),
  enteredAt: z.string(),
  enteredBy: named,
});

export const recordedEntry = z.object({
  entry,
  /** What somebody else entered there in between; both are kept, and the later one stands. */
  overtook: entry.nullable(),
});

const present = z.object({ id, name: z.string(), seenAt: z.string() });

/** Who is at a task now, by name. */
export const presentList = z.object({ items: z.array(present) });

export const followUp = z.object({
  stepKey: z.string(),
  place: z.int(),
  title: z.string(),
  defectId: id.nullable(),
  taskId: id.nullable(),
  state: z.enum(['open', 'done', 'withdrawn']),
  /** Whether it answers for the failure: it holds the unit still, or was done. */
  answers: z.boolean(),
});

export const signOff = z.object({
  id,
  kind: z.enum(['second_person', 'test_ride']),
  note: z.string().nullable(),
  signedAt: z.string(),
  signedBy: z.object({ id, name: z.string() }),
  /** A second person signs for what stood then: entries made since are not signed for. */
  stands: z.boolean(),
});

/** A result as it stood when its task was closed, with the limits it was judged by. */
export const closedResult = z.object({
  stepKey: z.string(),
  title: z.string(),
  per: z.enum(['unit', 'engine', 'cylinder', 'carb']),
  place: z.int(),
  stage: z.enum(STAGES).nullable(),
  unit: z.enum(MEASURED_UNITS).nullable(),
  value: entryValue,
  judged: judgement.nullable(),
  enteredAt: z.string(),
  enteredBy: named,
});

/** A signature as it stood when its task was closed. */
export const closedSignOff = z.object({
  kind: z.enum(['second_person', 'test_ride']),
  note: z.string().nullable(),
  signedAt: z.string(),
  signedBy: z.object({ id, name: z.string() }),
});

/** A task at the bench: all that was entered in the order it came in, who is at it, who signed. */
export const work = z.object({
  taskId: id,
  unitId: id,
  steps: z.custom<Step[]>(Array.isArray),
  counts: z.custom<UnitCounts>((value) => typeof value === 'object' && value !== null),
  specs: z.custom<Specs>((value) => typeof value === 'object' && value !== null),
  only: z.custom<OnlyPlace>((value) => typeof value === 'object' && value !== null).nullable(),
  holdsUnit: z.boolean(),
  wants: z.object({ secondPerson: z.boolean(), testRide: z.boolean() }),
  entries: z.array(entry),
  present: z.array(present),
  followUps: z.array(followUp),
  signOffs: z.array(signOff),
  endedAt: z.string().nullable(),
});

export type EntryInput = z.output<typeof entryInput>;
export type RecordEntry = z.output<typeof recordEntry>;
export type RecordedEntry = z.output<typeof recordedEntry>;
export type ClosingResult = z.output<typeof closingResult>;
export type OpenFollowUp = z.output<typeof openFollowUp>;
export type SignOffTask = z.output<typeof signOffTask>;
export type Present = z.output<typeof present>;
export type Entry = z.output<typeof entry>;
export type FollowUp = z.output<typeof followUp>;
export type SignOff = z.output<typeof signOff>;
export type Work = z.output<typeof work>;
