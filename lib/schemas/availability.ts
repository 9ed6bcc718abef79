import { z } from 'zod';
import { day, hours, id } from './common';

export const availabilityQuery = z.object({
  dockId: id.optional(),
  on: day.optional(),
  /** The planned outing in hours. */
  hours: z
    .string('give hours as a number')
    .regex(/^-?\d+(\.\d+)?$/, 'give hours as a number')
    .transform(Number)
    .pipe(hours)
    .optional(),
});

export const hold = z.object({
  reason: z.enum(['overdue', 'defect', 'laid_up', 'not_assessed', 'too_little_left']),
  ruleId: id.optional(),
  taskId: id.optional(),
  defectId: id.optional(),
  layUpId: id.optional(),
  since: z.string(),
  /** What holds the unit, by how much, and what lifts it. */
  text: z.string(),
});

const standing = {
  unitId: id,
  fleetNumber: z.string(),
  modelName: z.string(),
  carbCount: z.int(),
  dockId: id,
  engineHours: z.number(),
  /** What is left before a hold by each measure; 0 or less when the unit is held by it, null when nothing counts by it. */
  hoursToHold: z.number().nullable(),
  outingsToHold: z.int().nullable(),
  daysToHold: z.int().nullable(),
  holdingRuleId: id.nullable(),
  holdingRuleName: z.string().nullable(),
};

export const availability = z.object({
  asOf: z.string(),
  ready: z.array(z.object(standing)),
  out: z.array(
    z.object({
      ...standing,
      outingId: id,
      startedAt: z.string().nullable(),
      dueBackAt: z.string().nullable(),
      holds: z.array(hold),
    }),
  ),
  held: z.array(z.object({ ...standing, holds: z.array(hold) })),
});

export type AvailabilityQuery = z.output<typeof availabilityQuery>;
export type Availability = z.output<typeof availability>;
export type HoldShown = z.output<typeof hold>;
export type ReadyUnit = Availability['ready'][number];
export type OutUnit = Availability['out'][number];
export type HeldUnit = Availability['held'][number];

/** How one unit stands, with its last reading. */
export const unitReadiness = z.object({
  ...standing,
  state: z.enum(['ready', 'out', 'held']),
  holds: z.array(hold),
  dockName: z.string(),
  timeZone: z.string(),
  shownHours: z.number(),
  readAt: z.string(),
  outings: z.int(),
  outingId: id.nullable(),
  startedAt: z.string().nullable(),
  dueBackAt: z.string().nullable(),
});
export type UnitReadiness = z.output<typeof unitReadiness>;
