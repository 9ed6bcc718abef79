import { z } from 'zod';
import { id, line } from './common';
import { quantity } from './part';

/** What a closing takes out; at the unit's dock unless another is named. */
export const partUsed = z.strictObject({
  partId: id,
  quantity,
  dockId: id.optional(),
  reason: line(300).optional(),
});

/** What a closing took out of stock. */
export const closedPart = z.object({
  partId: id,
  number: z.string(),
  name: z.string(),
  quantity: z.int(),
  dockId: id,
  dockName: z.string(),
  reason: z.string().nullable(),
});

const none = z.int('give a whole number').min(0, 'cannot be below 0').max(100_000, 'cannot be above 100,000');

/** How many of a part a task needs, whatever its rule says; 0 for none. */
export const sayNeed = z.strictObject({ partId: id, quantity: none });

/** How many of a part are set aside for a task at a dock, the unit's unless named; 0 releases them. */
export const setReservation = z.strictObject({ partId: id, quantity: none, dockId: id.optional() });

/** One part of a task's: how many it needs, what lies at the unit's dock, and what other docks have. */
export const taskPart = z.object({
  partId: id,
  number: z.string(),
  name: z.string(),
  isKit: z.boolean(),
  needed: z.int(),
  /** At the unit's dock: on hand, of that set aside for this task, and what the task can count on. */
  onHand: z.int(),
  reserved: z.int(),
  free: z.int(),
  short: z.int(),
  /** Of a kit: how many more could be made up of what is free here. */
  canMakeUp: z.int(),
  elsewhere: z.array(z.object({ dockId: id, dockName: z.string(), free: z.int(), reserved: z.int() })),
});

export const taskParts = z.object({
  taskId: id,
  dockId: id,
  dockName: z.string(),
  parts: z.array(taskPart),
});

export type PartUsed = z.output<typeof partUsed>;
export type SayNeed = z.output<typeof sayNeed>;
export type SetReservation = z.output<typeof setReservation>;
export type TaskPart = z.output<typeof taskPart>;
export type TaskParts = z.output<typeof taskParts>;
