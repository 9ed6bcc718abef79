import type { Context } from '@/lib/context';
import { refuseField } from '@/lib/errors';
import { accessAttachment } from './access';
import type { FileStore } from './file-store';

/** The bytes of a picture or document, or of the small picture of it, for those who may see its unit. */
export type AttachmentFile = {
  bytes: Buffer;
  contentType: string;
  kind: 'picture' | 'document';
  name: string;
};

/** Throws `not_found` on `id` for one that is removed or has no such file, `forbidden`. */
export async function readAttachment(
  ctx: Context,
  id: string,
  { store, small }: { store: FileStore; small: boolean },
): Promise<AttachmentFile> {
  const row = await accessAttachment(ctx, id, 'attachment.read');
  const gone = () => refuseField('id', 'is not there any more', 'not_found');
  if (row.removed_at) throw gone();
  const key = small ? row.thumb_key : row.object_key;
  const bytes = key && (await store.get(key));
  if (!bytes) throw gone();
  const contentType = small ? 'image/jpeg' : row.content_type;
  return { bytes, contentType, kind: row.kind, name: row.name };
}
