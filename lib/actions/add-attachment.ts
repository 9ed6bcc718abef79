import { findAttachment, insertAttachment } from '@/db/queries/attachments';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { refuseField } from '@/lib/errors';
import type { AddAttachment, Attachment } from '@/lib/schemas/attachment';
import { randomKey } from '@/lib/secrets/random-key';
import { accessDefect, accessTask, accessUnit } from './access';
import type { FileStore, PrepareFile } from './file-store';
import { refusingTaken } from './refusing-taken';
import { toAttachment } from './shape-attachment';

const TAKEN = 'Another attachment has this id.';

/**
 * Keeps a picture or document of a unit, a task or a defect. Its files are stored first and its record after, so that
 * a failure in between leaves files that no record points to, which the sweep removes. An id that the unit has already
 * answers with that one and writes nothing. `readFile` is asked for the bytes only when all else is right.
 * Throws `not_found`, `forbidden`; `invalid_input` on `taskId` or `defectId` of another unit and on `file` for what is
 * no picture or document; `too_large` on `file`.
 */
export async function addAttachment(
  ctx: Context,
  input: AddAttachment,
  tools: { store: FileStore; prepare: PrepareFile; readFile: () => Promise<Buffer> },
): Promise<Attachment> {
  const unit = await accessUnit(ctx, input.unitId, 'attachment.write', 'unitId');
  if (input.taskId) {
    const task = await accessTask(ctx, input.taskId, 'attachment.write', 'taskId');
    if (task.unit_id !== unit.id) throw refuseField('taskId', 'is a task of another unit');
  }
  if (input.defectId) {
    const defect = await accessDefect(ctx, input.defectId, 'attachment.write', 'defectId');
    if (defect.unit_id !== unit.id) throw refuseField('defectId', 'is a defect of another unit');
  }
  const first = await findAttachment(ctx.db, input.id);
  if (first && first.unit_id !== unit.id) throw refuseField('id', TAKEN, 'conflict');
  if (first) return toAttachment(first);
  const file = await tools.prepare(await tools.readFile());
  const objectKey = randomKey();
  const thumbKey = file.thumb ? randomKey() : null;
  await tools.store.put(objectKey, file.bytes, file.contentType);
  if (file.thumb && thumbKey) await tools.store.put(thumbKey, file.thumb, 'image/jpeg');
  await refusingTaken({ attachment_pkey: ['id', 'This is being kept already. Look again.'] }, () =>
    insertAttachment(ctx.db, {
      id: input.id,
      unit_id: unit.id,
      task_id: input.taskId ?? null,
      defect_id: input.defectId ?? null,
      kind: file.kind,
      name: input.name,
      content_type: file.contentType,
      object_key: objectKey,
      thumb_key: thumbKey,
      bytes: file.bytes.length,
      width: file.width,
      height: file.height,
      added_at: ctx.now,
      added_by: personIdOf(ctx.actor),
    }),
  );
  return toAttachment((await findAttachment(ctx.db, input.id))!);
}
