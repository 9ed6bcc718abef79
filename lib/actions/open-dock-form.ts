import type { Context } from '@/lib/context';
import { canFleetWide } from '@/lib/domain/access';
import type { Dock } from '@/lib/schemas/dock';
import { requireFleetWide } from './access';
import { getDock } from './get-dock';

/**
 * What the form of a dock is drawn from, for a new one when `dockId` is null; `mayWrite` says whether the actor may
 * save it. Throws `not_found`, or `forbidden`.
 */
export async function openDockForm(
  ctx: Context,
  dockId: string | null,
): Promise<{ dock: Dock | null; mayWrite: boolean }> {
  if (!dockId) requireFleetWide(ctx, 'dock.write');
  return {
    dock: dockId ? await getDock(ctx, dockId) : null,
    mayWrite: canFleetWide(ctx.actor, 'dock.write'),
  };
}
