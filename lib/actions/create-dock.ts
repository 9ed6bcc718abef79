import { insertDock } from '@/db/queries/docks';
import type { Context } from '@/lib/context';
import type { CreateDock, Dock } from '@/lib/schemas/dock';
import { requireFleetWide } from './access';
import { refusingTaken } from './refusing-taken';
import { DOCK_NAME, toDock } from './shape-dock';

/** Adds a dock. Managers of all docks only. Throws `conflict` on `name` when a dock has that name already. */
export async function createDock(ctx: Context, input: CreateDock): Promise<Dock> {
  requireFleetWide(ctx, 'dock.write');
  const row = await refusingTaken(DOCK_NAME, () =>
    insertDock(ctx.db, {
      name: input.name,
      time_zone: input.timeZone,
      season_from: input.season?.from ?? null,
      season_to: input.season?.to ?? null,
      ...(input.openWeekdays && { open_weekdays: input.openWeekdays }),
      ...(input.craftNumbers && { craft_numbers: input.craftNumbers }),
    }),
  );
  return toDock(row);
}
