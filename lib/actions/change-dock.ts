import { updateDock } from '@/db/queries/docks';
import { listUnits } from '@/db/queries/units';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { refuseField } from '@/lib/errors';
import type { ChangeDock, Dock } from '@/lib/schemas/dock';
import { requireFleetWide } from './access';
import { enqueueRefresh } from './assess-again';
import { refusingTaken } from './refusing-taken';
import { DOCK_NAME, toDock } from './shape-dock';

/**
 * Changes what is named of a dock. Another time zone is another "today": the worker looks at its units again for
 * tasks that have come within their lead; due points are hours, counts and days of no time zone, and stay. Numbers
 * on craft are held to a changed `craftNumbers` from their next change on. Managers of all docks only.
 * Throws `not_found` on `id`, `conflict` on `name` when a dock has that name already.
 */
export async function changeDock(ctx: Context, id: string, input: ChangeDock): Promise<Dock> {
  requireFleetWide(ctx, 'dock.write');
  return refusingTaken(DOCK_NAME, () =>
    runTransaction(ctx.db, async (trx) => {
      const row = await updateDock(trx, id, {
        ...(input.name !== undefined && { name: input.name }),
        ...(input.timeZone !== undefined && { time_zone: input.timeZone }),
        ...(input.season !== undefined && {
          season_from: input.season?.from ?? null,
          season_to: input.season?.to ?? null,
        }),
        ...(input.openWeekdays && { open_weekdays: input.openWeekdays }),
        ...(input.craftNumbers && { craft_numbers: input.craftNumbers }),
      });
      if (!row) throw refuseField('id', 'is no dock of this fleet', 'not_found');
      if (input.timeZone !== undefined) {
        const units = await listUnits(trx, [id]);
        await enqueueRefresh(
          trx,
          units.map((unit) => unit.id),
        );
      }
      return toDock(row);
    }),
  );
}
