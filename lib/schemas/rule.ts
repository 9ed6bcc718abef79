import { z } from 'zod';
import { count, day, hours, id, line, text } from './common';
import { triggers, type TriggerShape } from './trigger';

/** At most ten years, so that every day around a due point is a day of the calendar. */
const days = z
  .int('give a whole number of days')
  .min(0, 'cannot be below 0 days')
  .max(3660, 'cannot be above 3,660 days');
const minutes = z
  .int('give whole minutes')
  .min(0, 'cannot be below 0 minutes')
  .max(100_000, 'cannot be above 100,000 minutes');
const carbs = z.int('give a whole number').min(0, 'cannot be below 0').max(16, 'cannot be above 16');
const ids = (noun: string) =>
  z.array(id).min(1, `name at least one ${noun}, or leave it out for all`).max(500, 'are at most 500');

const NO_LEAD = { hours: 0, outings: 0, days: 0 };
const NO_WINDOW = {
  earlyHours: 0,
  lateHours: 0,
  earlyOutings: 0,
  lateOutings: 0,
  earlyDays: 0,
  lateDays: 0,
};

const lead = z
  .strictObject({ hours: hours.default(0), outings: count.default(0), days: days.default(0) })
  .default(NO_LEAD);

const window = z
  .strictObject({
    earlyHours: hours.default(0),
    lateHours: hours.default(0),
    earlyOutings: count.default(0),
    lateOutings: count.default(0),
    earlyDays: days.default(0),
    lateDays: days.default(0),
  })
  .default(NO_WINDOW);

/** What due points are computed from, in decimal hours; what is left out of lead and window is 0. */
const schedule = { triggers, lead, window };

const appliesTo = z
  .strictObject({
    modelIds: ids('model').optional(),
    propulsion: z.enum(['jet', 'outboard', 'inboard', 'electric']).optional(),
    stroke: z.enum(['two', 'four']).optional(),
    carbCount: z.strictObject({ min: carbs.optional(), max: carbs.optional() }).optional(),
    dockIds: ids('dock').optional(),
  })
  .superRefine(({ carbCount }, ctx) => {
    if ((carbCount?.min ?? 0) > (carbCount?.max ?? Infinity))
      ctx.addIssue({ code: 'custom', path: ['carbCount', 'max'], message: 'is below the least' });
  });

const labour = z.strictObject({
  baseMinutes: minutes.default(0),
  perCarbMinutes: minutes.default(0),
  perEngineMinutes: minutes.default(0),
});

const parts = z
  .array(
    z.strictObject({
      partId: id,
      quantity: z.int('give a whole number').min(1, 'is at least 1').max(10_000, 'is too many'),
      per: z.enum(['unit', 'engine', 'cylinder', 'carb']),
    }),
  )
  .max(50, 'are at most 50');

const KINDS = ['inspection', 'service', 'rebuild'] as const;

const fields = {
  name: line(80),
  kind: z.enum(KINDS, 'is "inspection", "service" or "rebuild"'),
  appliesTo,
  ...schedule,
  holdsUnit: z.boolean('say true or false').default(true),
  labour: labour.default({ baseMinutes: 0, perCarbMinutes: 0, perEngineMinutes: 0 }),
  parts: parts.default([]),
  procedureId: id.nullable().optional(),
  /** Asked for at closing: a signature of somebody who did none of the work, and one for a test ride. */
  wantsSecondPerson: z.boolean('say true or false').default(false),
  wantsTestRide: z.boolean('say true or false').default(false),
};

/** The part of a rule that says when it is due. */
export const ruleSchedule = z.strictObject(schedule).superRefine(checkEarly);

export const createRule = z.strictObject(fields).superRefine(checkEarly);

/** As `createRule`: the whole rule. `revision` is the one that was edited; without it no conflict is looked for. */
export const changeRule = z
  .strictObject({ ...fields, revision: z.int('give a whole number').min(1).optional() })
  .superRefine(checkEarly);

export const endRule = z.strictObject({ reason: text(500).optional() });

export const rulesQuery = z.object({ ended: z.enum(['include']).optional() });

/** Work a preview asks for at most: closings and further points, times the calendar triggers that answer each. */
const MOST_CALENDAR_STEPS = 500;

/**
 * Anybody signed in may ask, so the worst is bounded: 8 triggers, 200 closings, 50 further points, and of all of
 * these together `MOST_CALENDAR_STEPS`.
 */
export const previewRule = z
  .strictObject({
    ...schedule,
    unit: z.strictObject({ enteredServiceOn: day, engineHours: hours, outings: count }),
    closings: z
      .array(z.strictObject({ on: day, engineHours: hours, outings: count }))
      .max(200, 'are at most 200')
      .default([]),
    today: day,
    count: z.int('give a whole number').min(0, 'cannot be below 0').max(50, 'cannot be above 50').default(3),
  })
  .superRefine(checkEarly)
  .superRefine(({ closings }, ctx) =>
    closings.forEach(({ on }, index) => {
      const before = closings[index - 1]?.on;
      if (before && on < before)
        ctx.addIssue({
          code: 'custom',
          path: ['closings', index, 'on'],
          message: 'is before the one above it',
        });
    }),
  )
  .superRefine(({ triggers, closings, count }, ctx) => {
    const calendars = triggers.filter(({ on }) => on === 'calendar').length;
    if (calendars * (closings.length + count) > MOST_CALENDAR_STEPS)
      ctx.addIssue({
        code: 'custom',
        path: ['closings'],
        message: `and further points are at most ${Math.floor(MOST_CALENDAR_STEPS / calendars)} in all with ${calendars} calendar triggers`,
      });
  });

const states = z.object({ overdue: z.int(), due: z.int(), upcoming: z.int() });

export const rule = z.object({
  id,
  ...fields,
  procedureId: id.nullable(),
  revision: z.int(),
  unitCount: z.int(),
  createdAt: z.string(),
  changedAt: z.string(),
  changedBy: z.string().nullable(),
  endedAt: z.string().nullable(),
  endedBy: z.string().nullable(),
  endReason: z.string().nullable(),
});

/** A rule in a list, with how many of its units are overdue, due and upcoming. */
export const listedRule = rule.extend({ states });

/** Where a trigger's meter or calendar is due: one of the three. */
export const due = z.union([
  z.object({ hours: z.number() }),
  z.object({ outings: z.int() }),
  z.object({ date: z.string() }),
]);
const state = z.enum(['clear', 'upcoming', 'due', 'overdue']);

export const rulePreview = z.object({
  triggers: z.array(z.object({ index: z.int(), due: due.nullable(), state, following: z.array(due) })),
  state,
});

export type CreateRule = z.output<typeof createRule>;
export type ChangeRule = z.output<typeof changeRule>;
export type EndRule = z.output<typeof endRule>;
export type PreviewRule = z.output<typeof previewRule>;
export type RulePreview = z.output<typeof rulePreview>;
export type Rule = z.output<typeof rule>;
export type ListedRule = z.output<typeof listedRule>;
export type RuleStates = z.output<typeof states>;
export type Due = z.output<typeof due>;
export type ScheduleShape = Pick<CreateRule, 'triggers' | 'lead' | 'window'>;

/** Work done a whole interval early would count for a due point that is not the next one. */
function checkEarly(
  { triggers, window }: { triggers: TriggerShape[]; window: CreateRule['window'] },
  ctx: z.RefinementCtx,
): void {
  for (const trigger of triggers) {
    if (trigger.on === 'engine_hours' && window.earlyHours >= trigger.every)
      refuse('earlyHours', `must be less than the ${trigger.every} h of the trigger`);
    if (trigger.on === 'outings' && window.earlyOutings >= trigger.every)
      refuse('earlyOutings', `must be less than the ${trigger.every} outings of the trigger`);
  }
  function refuse(field: string, message: string): void {
    ctx.addIssue({ code: 'custom', path: ['window', field], message });
  }
}
