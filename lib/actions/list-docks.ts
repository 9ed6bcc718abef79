import { listDocks as listDockRows } from '@/db/queries/docks';
import type { Context } from '@/lib/context';
import { visibleDocks } from '@/lib/domain/access';
import type { Dock } from '@/lib/schemas/dock';
import { requireFleetWide } from './access';
import { toDock } from './shape-dock';

/** The docks the actor works at, by name. */
export async function listDocks(ctx: Context): Promise<Dock[]> {
  requireFleetWide(ctx, 'dock.read');
  return (await listDockRows(ctx.db, visibleDocks(ctx.actor))).map(toDock);
}
