import { z } from 'zod';
import { id, line } from './common';

const PROPULSIONS = ['jet', 'outboard', 'inboard', 'electric'] as const;
const STROKES = ['two', 'four'] as const;
const whole = (max: number) =>
  z.int('give a whole number').min(0, 'cannot be below 0').max(max, `cannot be above ${max}`);

export const createModel = z
  .strictObject({
    name: line(80),
    propulsion: z.enum(PROPULSIONS),
    stroke: z.enum(STROKES).optional(),
    engines: whole(4).min(1, 'is at least 1'),
    cylinders: whole(16),
    carbCount: whole(16),
    specs: z.record(z.string().max(60), z.unknown()).optional(),
  })
  .superRefine((model, ctx) => {
    const electric = model.propulsion === 'electric';
    if (electric && model.stroke)
      ctx.addIssue({ code: 'custom', path: ['stroke'], message: 'an electric motor has no stroke' });
    if (electric && model.carbCount > 0)
      ctx.addIssue({ code: 'custom', path: ['carbCount'], message: 'an electric motor has no carburettor' });
    if (!electric && !model.stroke)
      ctx.addIssue({ code: 'custom', path: ['stroke'], message: 'say two or four stroke' });
  });

export const model = z.object({
  id,
  name: z.string(),
  propulsion: z.enum(PROPULSIONS),
  stroke: z.enum(STROKES).nullable(),
  engines: z.int(),
  cylinders: z.int(),
  carbCount: z.int(),
  specs: z.record(z.string(), z.unknown()),
});

export type CreateModel = z.output<typeof createModel>;
export type Model = z.output<typeof model>;
