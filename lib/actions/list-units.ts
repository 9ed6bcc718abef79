import { listUnits as listUnitRows } from '@/db/queries/units';
import type { Context } from '@/lib/context';
import { visibleDocks } from '@/lib/domain/access';
import { requireAtDock } from './access';
import { toUnit } from './shape-unit';
import type { Unit } from '@/lib/schemas/unit';

/** The units of the docks the actor works at, by fleet number; `dockId` narrows them. Throws `forbidden` on `dockId`. */
export async function listUnits(
  ctx: Context,
  query: { dockId?: string },
): Promise<{ items: Unit[]; nextCursor: string | null }> {
  if (query.dockId) requireAtDock(ctx, 'unit.read', query.dockId, 'dockId');
  const rows = await listUnitRows(ctx.db, query.dockId ? [query.dockId] : visibleDocks(ctx.actor));
  return { items: rows.map(toUnit), nextCursor: null };
}
