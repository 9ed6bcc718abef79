import type { Context } from '@/lib/context';
import type { Dock } from '@/lib/schemas/dock';
import { accessDock } from './access';
import { toDock } from './shape-dock';

/** One dock. Throws `not_found`, or `forbidden` to whoever does not work there. */
export async function getDock(ctx: Context, id: string): Promise<Dock> {
  return toDock(await accessDock(ctx, id, 'unit.read', 'id'));
}
