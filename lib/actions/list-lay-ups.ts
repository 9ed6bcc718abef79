import { listLayUps as listLayUpRows } from '@/db/queries/lay-ups';
import type { Context } from '@/lib/context';
import { visibleDocks } from '@/lib/domain/access';
import type { LayUp, LayUpsQuery } from '@/lib/schemas/lay-up';
import { accessUnit, requireSomewhere } from './access';
import { toLayUp } from './shape-lay-up';

/**
 * Lay-ups at the docks the actor works at, the latest first, at most 500; `unitId` and `open` narrow them.
 * Throws `not_found` or `forbidden` on `unitId`.
 */
export async function listLayUps(
  ctx: Context,
  query: LayUpsQuery,
): Promise<{ items: LayUp[]; nextCursor: string | null }> {
  if (query.unitId) await accessUnit(ctx, query.unitId, 'unit.read', 'unitId');
  else requireSomewhere(ctx, 'unit.read');
  const rows = await listLayUpRows(ctx.db, visibleDocks(ctx.actor), query);
  return { items: rows.map(toLayUp), nextCursor: null };
}
