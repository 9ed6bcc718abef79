import { listDefects as listDefectRows } from '@/db/queries/defects';
import type { Context } from '@/lib/context';
import { visibleDocks } from '@/lib/domain/access';
import type { Defect, DefectsQuery } from '@/lib/schemas/defect';
import { accessUnit, requireSomewhere } from './access';
import { toDefect } from './shape-defect';

/**
 * Defects at the docks the actor works at, the latest first, at most 500; `unitId` and `open` narrow them.
 * Throws `not_found` or `forbidden` on `unitId`.
 */
export async function listDefects(
  ctx: Context,
  query: DefectsQuery,
): Promise<{ items: Defect[]; nextCursor: string | null }> {
  if (query.unitId) await accessUnit(ctx, query.unitId, 'unit.read', 'unitId');
  else requireSomewhere(ctx, 'unit.read');
  const rows = await listDefectRows(ctx.db, visibleDocks(ctx.actor), query);
  return { items: rows.map(toDefect), nextCursor: null };
}
