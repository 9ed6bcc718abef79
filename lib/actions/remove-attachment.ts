import { findAttachment, isOnRecord, updateRemoved } from '@/db/queries/attachments';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { refuseField } from '@/lib/errors';
import type { Attachment } from '@/lib/schemas/attachment';
import { accessAttachment, requireAtDock } from './access';
import { toAttachment } from './shape-attachment';

/**
 * Removes a picture or document: by whoever added it, or a manager or mechanic of its dock. It can be brought back for
 * a week. Throws `not_found`, `forbidden`, `conflict` on `id` when a closed task's record names it.
 */
export async function removeAttachment(ctx: Context, id: string): Promise<Attachment> {
  const row = await accessOwn(ctx, id);
  if (await isOnRecord(ctx.db, id))
    throw refuseField('id', 'is part of the record of a task that was closed', 'conflict');
  if (!row.removed_at)
    await updateRemoved(ctx.db, id, { removed_at: ctx.now, removed_by: personIdOf(ctx.actor) });
  return toAttachment((await findAttachment(ctx.db, id))!);
}

/** Brings a removed picture or document back. Throws `not_found`, `forbidden`. */
export async function restoreAttachment(ctx: Context, id: string): Promise<Attachment> {
  await accessOwn(ctx, id);
  await updateRemoved(ctx.db, id, { removed_at: null, removed_by: null });
  return toAttachment((await findAttachment(ctx.db, id))!);
}

async function accessOwn(ctx: Context, id: string) {
  const row = await accessAttachment(ctx, id, 'attachment.write');
  if (row.added_by !== personIdOf(ctx.actor)) requireAtDock(ctx, 'attachment.remove', row.dock_id);
  return row;
}
