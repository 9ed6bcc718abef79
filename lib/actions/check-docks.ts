import { listDocks } from '@/db/queries/docks';
import type { Context } from '@/lib/context';
import { Refusal } from '@/lib/errors';

/** Throws `not_found` on each of `dockIds` that is no dock. */
export async function checkDocks(ctx: Context, dockIds: readonly string[]): Promise<void> {
  if (dockIds.length === 0) return;
  const known = new Set((await listDocks(ctx.db, dockIds)).map((dock) => dock.id));
  const errors = dockIds.flatMap((id, index) =>
    known.has(id) ? [] : [{ path: `dockIds.${index}`, message: 'is no dock of this fleet' }],
  );
  if (errors.length > 0) throw new Refusal('not_found', 'One of the docks is no dock of this fleet.', errors);
}
