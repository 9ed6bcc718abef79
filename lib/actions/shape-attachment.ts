import type { AttachmentRow } from '@/db/queries/attachments';
import type { Attachment } from '@/lib/schemas/attachment';
import { toNamed } from './shape-task';

/** A picture or document as the API and the screens show it; where its file lies stays here. */
export function toAttachment(row: AttachmentRow): Attachment {
  return {
    id: row.id,
    unitId: row.unit_id,
    taskId: row.task_id,
    taskTitle: row.task_title,
    defectId: row.defect_id,
    defectTitle: row.defect_title,
    kind: row.kind,
    name: row.name,
    bytes: row.bytes,
    width: row.width,
    height: row.height,
    addedAt: row.added_at.toISOString(),
    addedBy: toNamed(row.added_by, row.author_name),
    removedAt: row.removed_at?.toISOString() ?? null,
  };
}
