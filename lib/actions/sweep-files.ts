import { deleteRemoved, listKnownKeys } from '@/db/queries/attachments';
import type { Context } from '@/lib/context';
import type { FileStore } from './file-store';

const DAY_MS = 24 * 60 * 60_000;
/** How long a removed picture can be brought back. */
const KEPT_MS = 7 * DAY_MS;
/** A file younger than this may be one whose record is being written. */
const SETTLED_MS = DAY_MS;

/** Deletes for good what was removed a week ago, and every file that no record points to. Again, it changes nothing. */
export async function sweepFiles(ctx: Context, store: FileStore): Promise<{ deleted: number }> {
  const removed = await deleteRemoved(ctx.db, new Date(ctx.now.getTime() - KEPT_MS));
  if (removed.length > 0) await store.delete(removed);
  let deleted = removed.length;
  for await (const keys of store.listBefore(new Date(ctx.now.getTime() - SETTLED_MS))) {
    const known = await listKnownKeys(ctx.db, keys);
    const orphans = keys.filter((key) => !known.has(key));
    if (orphans.length > 0) await store.delete(orphans);
    deleted += orphans.length;
  }
  return { deleted };
}
