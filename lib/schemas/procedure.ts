import { z } from 'zod';
import { MEASURED_UNITS } from '@/lib/domain/measured-value';
import type { Step } from '@/lib/domain/procedure';
import { id, line, text } from './common';

export const PROCEDURE_KINDS = ['inspection', 'service', 'rebuild', 'repair'] as const;
const STEP_KINDS = ['check', 'measurement', 'note', 'photo', 'caution'] as const;
const PER = ['unit', 'engine', 'cylinder', 'carb'] as const;

const key = z
  .string('give a key')
  .regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'is small letters, digits and hyphens')
  .max(60, 'is longer than 60 characters');
const flag = z.boolean('is true or false');

const step = z
  .strictObject({
    key,
    kind: z.enum(STEP_KINDS, 'is check, measurement, note, photo or caution'),
    title: line(160),
    detail: text(2000).optional(),
    caution: text(1000).optional(),
    per: z.enum(PER, 'is unit, engine, cylinder or carb').default('unit'),
    required: flag.default(true),
    measures: z
      .strictObject({
        spec: line(60),
        unit: z.enum(MEASURED_UNITS, 'is no unit of measure known here'),
        stages: z
          .array(z.enum(['found', 'left'], 'is found or left'))
          .min(1, 'name found, left or both')
          .max(2),
      })
      .optional(),
    when: z
      .array(z.strictObject({ step: key, outcome: z.enum(['pass', 'fail'], 'is pass or fail') }))
      .min(1, 'names no step')
      .max(5, 'names more than 5 steps')
      .optional(),
    retests: key.optional(),
    onFail: z
      .strictObject({
        open: z.enum(['task', 'defect'], 'is task or defect'),
        title: line(120),
        kind: z.enum(PROCEDURE_KINDS, 'is inspection, service, rebuild or repair').optional(),
        holdsUnit: flag.default(true),
        procedureId: id.optional(),
      })
      .optional(),
  })
  .superRefine(({ kind, measures, retests, onFail }, ctx) => {
    const say = (path: string, message: string) => ctx.addIssue({ code: 'custom', path: [path], message });
    if (kind === 'measurement' && !measures) say('measures', 'say what is measured');
    if (kind !== 'measurement' && measures) say('measures', 'belongs to a measurement');
    if (retests && kind !== 'check' && kind !== 'measurement')
      say('retests', 'belongs to a check or a measurement');
    if (onFail && kind !== 'check' && kind !== 'measurement')
      say('onFail', 'belongs to a check or a measurement');
  });

/** A step depends on an earlier one that can pass or fail; each has a key of its own. */
const steps = z
  .array(step, 'give the steps')
  .min(1, 'has no step')
  .max(120, 'has more than 120 steps')
  .superRefine((list, ctx) =>
    list.forEach(({ key: own, per, when, retests }, index) => {
      const say = (path: string, message: string) =>
        ctx.addIssue({ code: 'custom', path: [index, path], message });
      const earlier = list.slice(0, index);
      if (earlier.some((other) => other.key === own)) say('key', 'is the key of an earlier step');
      if (retests !== undefined) {
        const again = earlier.find((other) => other.key === retests);
        if (!again) say('retests', 'names a step that does not come before it');
        else if (again.kind !== 'check' && again.kind !== 'measurement')
          say('retests', 'names a step that neither passes nor fails');
        else if (again.per !== per) say('retests', 'names a step that is done for something else');
      }
      for (const condition of when ?? []) {
        const on = earlier.find((other) => other.key === condition.step);
        if (!on) say('when', 'depends on a step that does not come before it');
        else if (on.kind !== 'check' && on.kind !== 'measurement')
          say('when', 'depends on a step that neither passes nor fails');
      }
    }),
  );

const fields = {
  name: line(80),
  kind: z.enum(PROCEDURE_KINDS, 'is inspection, service, rebuild or repair'),
  steps,
};

export const createProcedure = z.strictObject({ ...fields, note: text(500).optional() });

/** As `createProcedure`, the whole of it; `version` is the one that was edited, without it no conflict is looked for. */
export const changeProcedure = z.strictObject({
  ...fields,
  note: text(500).optional(),
  version: z.int('give a whole number').min(1).optional(),
});

const who = z.object({ id, name: z.string() }).nullable();

export const procedureVersion = z.object({
  version: z.int(),
  note: z.string().nullable(),
  /** What it has that the version before had not, in words; empty for the first. */
  changes: z.array(z.string()),
  writtenAt: z.string(),
  writtenBy: who,
});

/** A procedure with the steps of its latest version and who wrote each version. */
export const procedure = z.object({
  id,
  name: z.string(),
  kind: z.enum(PROCEDURE_KINDS),
  version: z.int(),
  steps: z.custom<Step[]>(Array.isArray),
  versions: z.array(procedureVersion),
  retiredAt: z.string().nullable(),
});

/** A procedure in a list. */
export const procedureLine = z.object({
  id,
  name: z.string(),
  kind: z.enum(PROCEDURE_KINDS),
  version: z.int(),
  stepCount: z.int(),
  ruleNames: z.array(z.string()),
  writtenAt: z.string(),
  writtenBy: who,
});

/** The version that a task keeps. */
export const taskProcedure = z.object({
  id,
  name: z.string(),
  version: z.int(),
  steps: z.custom<Step[]>(Array.isArray),
});

export type CreateProcedure = z.output<typeof createProcedure>;
export type ChangeProcedure = z.output<typeof changeProcedure>;
export type Procedure = z.output<typeof procedure>;
/** What the form of a procedure is drawn from. */
export type ProcedureFormData = { procedure: Procedure | null; specNames: string[] };
export type ProcedureLine = z.output<typeof procedureLine>;
export type TaskProcedure = z.output<typeof taskProcedure>;
