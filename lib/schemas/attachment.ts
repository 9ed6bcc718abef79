import { z } from 'zod';
import { id, line } from './common';

/** The largest file that is taken, in bytes: a phone's picture is a third of it. */
export const MAX_FILE_BYTES = 15 * 1024 * 1024;

/** Of what, and under which name, the body is kept. `id` is of the caller's making. */
export const addAttachment = z.strictObject({
  id,
  unitId: id,
  taskId: id.optional(),
  defectId: id.optional(),
  name: line(120),
});

export const attachmentsQuery = z
  .strictObject({ unitId: id, taskId: id, defectId: id })
  .partial()
  .refine((of) => Object.keys(of).length === 1, 'name a unitId, a taskId or a defectId');

const named = z.object({ id, name: z.string() }).nullable();

export const attachment = z.object({
  id,
  unitId: id,
  taskId: id.nullable(),
  taskTitle: z.string().nullable(),
  defectId: id.nullable(),
  defectTitle: z.string().nullable(),
  kind: z.enum(['picture', 'document']),
  name: z.string(),
  bytes: z.int(),
  width: z.int().nullable(),
  height: z.int().nullable(),
  addedAt: z.string(),
  addedBy: named,
  removedAt: z.string().nullable(),
});

export type AddAttachment = z.output<typeof addAttachment>;
export type AttachmentsQuery = z.output<typeof attachmentsQuery>;
export type Attachment = z.output<typeof attachment>;
