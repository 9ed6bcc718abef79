import { z } from 'zod';
import { id } from './common';
import { due } from './rule';

const state = z.enum(['clear', 'upcoming', 'due', 'overdue']);

/** What is left to a point, in the meter's own measure; below 0 it is past. */
const left = z.union([
  z.object({ hours: z.number() }),
  z.object({ outings: z.int() }),
  z.object({ days: z.int() }),
]);

/**
 * How a unit stands under one rule. `due` is the point itself, `overdueFrom` the first hour, outing or day at
 * which it is overdue; a trigger whose calendar is used up has neither.
 */
export const unitDuty = z.object({
  ruleId: id,
  ruleName: z.string(),
  kind: z.enum(['inspection', 'service', 'rebuild']),
  holdsUnit: z.boolean(),
  state,
  triggers: z.array(
    z.object({
      index: z.int(),
      on: z.enum(['engine_hours', 'outings', 'calendar']),
      due: due.nullable(),
      overdueFrom: due.nullable(),
      state,
      left: left.nullable(),
      leftToOverdue: left.nullable(),
    }),
  ),
  lastDone: z.object({ on: z.string(), engineHours: z.number(), outings: z.int() }).nullable(),
});

/** How a unit stands under every rule it is for, worst first. `assessed` is false while they are being computed. */
export const unitDuePoints = z.object({
  unitId: id,
  engineHours: z.number(),
  outings: z.int(),
  today: z.string(),
  assessed: z.boolean(),
  items: z.array(unitDuty),
});

export type Left = z.output<typeof left>;
export type UnitDuty = z.output<typeof unitDuty>;
export type UnitDuePoints = z.output<typeof unitDuePoints>;
