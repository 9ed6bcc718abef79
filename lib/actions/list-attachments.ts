import { listAttachments as listRows } from '@/db/queries/attachments';
import type { Context } from '@/lib/context';
import type { Attachment, AttachmentsQuery } from '@/lib/schemas/attachment';
import { accessDefect, accessTask, accessUnit } from './access';
import { toAttachment } from './shape-attachment';

/** The pictures and documents of a unit, a task or a defect, the latest first. Throws `not_found`, `forbidden`. */
export async function listAttachments(
  ctx: Context,
  of: AttachmentsQuery,
): Promise<{ items: Attachment[]; nextCursor: null }> {
  if (of.unitId) await accessUnit(ctx, of.unitId, 'attachment.read', 'unitId');
  if (of.taskId) await accessTask(ctx, of.taskId, 'attachment.read', 'taskId');
  if (of.defectId) await accessDefect(ctx, of.defectId, 'attachment.read', 'defectId');
  return { items: (await listRows(ctx.db, of)).map(toAttachment), nextCursor: null };
}
