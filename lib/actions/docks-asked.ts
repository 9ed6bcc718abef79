import type { Context } from '@/lib/context';
import { visibleDocks, type DockAct } from '@/lib/domain/access';
import { accessDock } from './access';

/**
 * The docks a list is asked for: the one that is named, else those the actor works at. Throws `not_found` on `dockId`
 * when there is no such dock, `forbidden` on `dockId` when the actor does not work there.
 */
export async function docksAsked(
  ctx: Context,
  dockId: string | undefined,
  act: DockAct,
): Promise<'all' | readonly string[]> {
  return dockId === undefined ? visibleDocks(ctx.actor) : [(await accessDock(ctx, dockId, act)).id];
}
