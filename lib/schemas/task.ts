import { z } from 'zod';
import { URGENCIES } from '@/lib/domain/urgency';
import { taskProcedure } from './procedure';
import { closedPart, partUsed } from './task-parts';
import { closedResult, closedSignOff, closingResult } from './work';
import { day, hours, id, instant, line, pageQuery, text } from './common';

export const TASK_KINDS = ['inspection', 'service', 'rebuild', 'repair'] as const;
/** What a person may open without a rule; a rebuild follows from a rule. */
export const AD_HOC_KINDS = ['repair', 'inspection', 'service'] as const;
const DUE_STATES = ['clear', 'upcoming', 'due', 'overdue'] as const;

const detail = text(4000);

/** Work that a person asks for; or, with `ruleId`, a rule's own task, opened before its lead. */
export const openTask = z
  .strictObject({
    unitId: id,
    ruleId: id.optional(),
    kind: z.enum(AD_HOC_KINDS, 'is repair, inspection or service').optional(),
    title: line(120).optional(),
    detail: detail.optional(),
    plannedOn: day.optional(),
    holdsUnit: z.boolean('is true or false').optional(),
    procedureId: id.optional(),
  })
  .superRefine((input, ctx) => {
    const say = (path: string, message: string) => ctx.addIssue({ code: 'custom', path: [path], message });
    if (input.ruleId === undefined) {
      if (input.kind === undefined) say('kind', 'say repair, inspection or service');
      if (input.title === undefined) say('title', 'say what is to be done');
      if (input.holdsUnit && input.kind !== undefined && input.kind !== 'repair')
        say('holdsUnit', 'only a repair holds the unit');
    } else {
      if (input.kind !== undefined) say('kind', 'comes from the rule: leave it out');
      if (input.title !== undefined) say('title', 'comes from the rule: leave it out');
      if (input.holdsUnit !== undefined) say('holdsUnit', 'comes from the rule: leave it out');
      if (input.procedureId !== undefined) say('procedureId', 'comes from the rule: leave it out');
    }
  });

/** Only what is named changes. With `revision`, only if nobody changed the task since it was read. */
export const changeTask = z
  .strictObject({
    started: z.boolean('is true or false'),
    plannedOn: day.nullable(),
    title: line(120),
    detail: detail.nullable(),
    revision: z.int('give the revision the task was read at'),
  })
  .partial()
  .refine((input) => Object.keys(input).some((key) => key !== 'revision'), 'names nothing to change');

export const writeNote = z.strictObject({ text: text(4000).min(1, 'is empty') });
export const withdrawTask = z.strictObject({ reason: line(500) });

export const tasksQuery = z.object({
  state: z.enum(['open', 'closed', 'all'], 'is open, closed or all').default('open'),
  dockId: id.optional(),
  unitId: id.optional(),
  kind: z.enum(TASK_KINDS, 'is inspection, service, rebuild or repair').optional(),
  mine: z.enum(['true', 'false'], 'is true or false').optional(),
  ...pageQuery,
});

/** Where a page of open tasks ended, by urgency. */
export const urgentPlace = z.object({
  id: z.uuid(),
  urgency: z.enum(URGENCIES),
  plannedOn: z.iso.date().nullable(),
  openedAt: z.iso.datetime(),
  fleetNumber: z.string(),
});

const named = z.object({ id, name: z.string() }).nullable();

/** How far one trigger of a rule still is from its due point on the unit; negative when it is past. */
export const duePoint = z.object({
  on: z.enum(['engine_hours', 'outings', 'calendar']),
  state: z.enum(DUE_STATES),
  dueAtHours: z.number().nullable(),
  dueAtOutings: z.int().nullable(),
  dueOn: z.string().nullable(),
  /** Hours, outings or days until the due point. */
  left: z.number(),
  /** Hours, outings or days until it is overdue. */
  leftToOverdue: z.number(),
});

export const task = z.object({
  id,
  unitId: id,
  fleetNumber: z.string(),
  dockId: id,
  dockName: z.string(),
  timeZone: z.string(),
  kind: z.enum(TASK_KINDS),
  title: z.string(),
  detail: z.string().nullable(),
  origin: z.enum(['rule', 'defect', 'person']),
  ruleId: id.nullable(),
  defectId: id.nullable(),
  progress: z.enum(['open', 'started', 'closed', 'withdrawn']),
  /** How the unit stands under the task's rule; null for a task without one, and once it has ended. */
  state: z.enum(DUE_STATES).nullable(),
  /** Whether the unit may not be hired out because of this. */
  holdsUnit: z.boolean(),
  urgency: z.enum(URGENCIES).nullable(),
  points: z.array(duePoint),
  plannedOn: z.string().nullable(),
  today: z.string(),
  expectedMinutes: z.int().nullable(),
  openedAt: z.string(),
  startedAt: z.string().nullable(),
  startedBy: named,
  endedAt: z.string().nullable(),
  withdrawReason: z.string().nullable(),
  /** How it was closed, unless that was reversed. */
  closed: z
    .object({
      closureId: id,
      closedAt: z.string(),
      closedOn: z.string(),
      engineHours: z.number(),
      closedBy: named,
    })
    .nullable(),
  revision: z.int(),
});

export const taskNote = z.object({ id, text: z.string(), writtenAt: z.string(), writtenBy: named });

export const closeTask = z.strictObject({
  at: instant.optional(),
  engineHours: hours.optional(),
  results: z.array(closingResult).max(2000, 'are at most 2,000').optional(),
  partsUsed: z.array(partUsed).max(200, 'are at most 200').optional(),
  minutes: z
    .int('give whole minutes')
    .min(0, 'cannot be below 0')
    .max(60_000, 'is more than 1,000 hours of work')
    .optional(),
  note: text(4000).optional(),
});

export const reverseClosure = z.strictObject({ reason: line(500) });

export const closure = z.object({
  id,
  taskId: id,
  unitId: id,
  ruleId: id.nullable(),
  closedAt: z.string(),
  closedOn: z.string(),
  engineHours: z.number(),
  outings: z.int(),
  minutes: z.int().nullable(),
  note: z.string().nullable(),
  results: z.array(closedResult),
  signOffs: z.array(closedSignOff),
  partsUsed: z.array(closedPart),
  heldSince: z.string().nullable(),
  closedBy: named,
  reversedAt: z.string().nullable(),
  reversedBy: named,
  reverseReason: z.string().nullable(),
});

/** A task as its own page shows it. */
export const taskPage = task.extend({
  modelName: z.string(),
  engineHours: z.number(),
  outings: z.int(),
  readAt: z.string(),
  /** What the task's rule means, sentence by sentence; empty for a task without one. */
  ruleWords: z.array(z.string()),
  heldSince: z.string().nullable(),
  /** The procedure that the work follows, in the version that stood when the task was opened. */
  procedure: taskProcedure.nullable(),
  notes: z.array(taskNote),
  /** This task's own, and those of the same rule on the same unit: the latest first, reversed ones included. */
  closures: z.array(closure),
});

export type OpenTask = z.output<typeof openTask>;
export type ChangeTask = z.output<typeof changeTask>;
export type WriteNote = z.output<typeof writeNote>;
export type WithdrawTask = z.output<typeof withdrawTask>;
export type TasksQuery = z.output<typeof tasksQuery>;
export type CloseTask = z.output<typeof closeTask>;
export type ReverseClosure = z.output<typeof reverseClosure>;
export type Task = z.output<typeof task>;
export type TaskNote = z.output<typeof taskNote>;
export type TaskPage = z.output<typeof taskPage>;
export type TaskDuePoint = z.output<typeof duePoint>;
export type Closure = z.output<typeof closure>;
