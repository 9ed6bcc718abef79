import { z } from 'zod';
import { id, line } from './common';

const PROPULSIONS = ['jet', 'outboard', 'inboard', 'electric'] as const;
const STROKES = ['two', 'four'] as const;
const whole = (max: number) =>
  z.int('give a whole number').min(0, 'cannot be below 0').max(max, `cannot be above ${max}`);

const limit = z.number('give a number').min(-1e9, 'is too small').max(1e9, 'is too large').optional();

/** How much is allowed: an amount in the spec's unit of measure, or a percentage of the largest value. */
const allowance = z
  .strictObject({
    amount: z.number('give a number').min(0, 'cannot be below 0').max(1e9, 'is too large'),
    of: z.enum(['unit', 'percent'], 'is unit or percent'),
  })
  .optional();

/**
 * The limits of one measurement, each optional, in the unit of measure named: `{"min": 150, "unit": "psi"}`; how many
 * runs are wanted, how far they may lie apart, and how far carburettors, cylinders or engines may.
 */
const spec = z
  .strictObject(
    {
      min: limit,
      max: limit,
      target: limit,
      unit: line(20).optional(),
      repeats: z.int('give a whole number').min(1, 'is at least 1').max(10, 'is at most 10').optional(),
      maxSpread: allowance,
      maxDifference: allowance,
    },
    'give min, max, target, unit, repeats, maxSpread or maxDifference',
  )
  .superRefine(({ min, max, target }, ctx) => {
    const say = (path: string, message: string) => ctx.addIssue({ code: 'custom', path: [path], message });
    if (min !== undefined && max !== undefined && max < min) say('max', 'is below the least');
    if (target !== undefined && min !== undefined && target < min) say('target', 'is below the least');
    if (target !== undefined && max !== undefined && target > max) say('target', 'is above the most');
  });

/** By the measurement's name: `{"Compression": {"min": 150, "max": 180, "unit": "psi"}}`. */
export const specs = z
  .record(line(60), spec, 'give specs by name')
  .refine((value) => Object.keys(value).length <= 60, 'has more than 60 specs');

const fields = {
  name: line(80),
  propulsion: z.enum(PROPULSIONS),
  engines: whole(4).min(1, 'is at least 1'),
  cylinders: whole(16),
  carbCount: whole(16),
};

type Engine = { propulsion: string; stroke?: string | null | undefined; carbCount: number };

/** What of a model contradicts itself, by field: an electric motor has no stroke, any other engine has one. */
export function findEngineFaults({
  propulsion,
  stroke,
  carbCount,
}: Engine): { path: string; message: string }[] {
  if (propulsion !== 'electric') return stroke ? [] : [{ path: 'stroke', message: 'say two or four stroke' }];
  return [
    ...(stroke ? [{ path: 'stroke', message: 'an electric motor has no stroke' }] : []),
    ...(carbCount > 0 ? [{ path: 'carbCount', message: 'an electric motor has no carburettor' }] : []),
  ];
}

export const createModel = z
  .strictObject({ ...fields, stroke: z.enum(STROKES).optional(), specs: specs.optional() })
  .superRefine((model, ctx) => {
    for (const { path, message } of findEngineFaults(model))
      ctx.addIssue({ code: 'custom', path: [path], message });
  });

/** Only what is named changes; a stroke of null takes it away, specs are replaced as a whole. */
export const changeModel = z
  .strictObject({ ...fields, stroke: z.enum(STROKES).nullable(), specs })
  .partial()
  .refine((input) => Object.keys(input).length > 0, 'names nothing to change');

export const model = z.object({
  id,
  name: z.string(),
  propulsion: z.enum(PROPULSIONS),
  stroke: z.enum(STROKES).nullable(),
  engines: z.int(),
  cylinders: z.int(),
  carbCount: z.int(),
  specs,
});

export type CreateModel = z.output<typeof createModel>;
export type ChangeModel = z.output<typeof changeModel>;
export type Model = z.output<typeof model>;
export type Spec = z.output<typeof spec>;
