import { z } from 'zod';
import { count, day, hours, id, line } from './common';
import type { UnitDuePoints } from './due-point';

/** "Last done at …": for a unit that comes with a past. `note` says who says so. */
export const recordBaseline = z.strictObject({
  ruleId: id,
  closedOn: day,
  engineHours: hours,
  outings: count.optional(),
  note: line(500),
});

export const baselineParams = z.object({ id, baselineId: id });

export const baseline = z.object({
  id,
  unitId: id,
  ruleId: id,
  ruleName: z.string(),
  closedOn: z.string(),
  engineHours: z.number(),
  outings: z.int(),
  note: z.string(),
  recordedAt: z.string(),
  recordedBy: z.string().nullable(),
  withdrawnAt: z.string().nullable(),
  withdrawnBy: z.string().nullable(),
});

export type RecordBaseline = z.output<typeof recordBaseline>;
export type Baseline = z.output<typeof baseline>;

/** What the screen of a unit's baselines is drawn from. */
export type UnitBaselines = {
  unit: { id: string; fleetNumber: string; dockName: string };
  standing: UnitDuePoints;
  baselines: Baseline[];
  mayRecord: boolean;
  mayWithdraw: boolean;
};
