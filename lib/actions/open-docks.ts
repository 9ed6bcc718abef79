import { listUnits } from '@/db/queries/units';
import type { Context } from '@/lib/context';
import { canFleetWide, visibleDocks } from '@/lib/domain/access';
import type { DocksPage } from '@/lib/schemas/fleet';
import { listDocks } from './list-docks';

/** What the screen of docks is drawn from: those the actor works at, each with how many units it has. */
export async function openDocks(ctx: Context): Promise<DocksPage> {
  const [docks, units] = await Promise.all([listDocks(ctx), listUnits(ctx.db, visibleDocks(ctx.actor))]);
  return {
    docks: docks.map((dock) => ({
      ...dock,
      unitCount: units.filter((unit) => unit.dock_id === dock.id).length,
    })),
    mayWrite: canFleetWide(ctx.actor, 'dock.write'),
  };
}
