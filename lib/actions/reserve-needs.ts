import type { Transaction } from 'kysely';
import { insertReservations, listReservations, releaseReservations } from '@/db/queries/reservations';
import { lockShelves, spotKey } from '@/db/queries/stock';
import type { DB } from '@/db/tables';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { computeFree, computeReservation } from '@/lib/domain/stock';
import { loadTaskNeeds } from './task-needs';

/**
 * Sets aside for a task what it needs and has not yet, as far as it is free at the unit's dock; what is missing is
 * left out. The caller has locked the task.
 */
export async function reserveNeeds(ctx: Context, trx: Transaction<DB>, taskId: string): Promise<void> {
  const { row, needs } = await loadTaskNeeds(trx, taskId);
  if (needs.length === 0) return;
  const spots = needs.map(({ partId }) => ({ partId, dockId: row.dock_id }));
  const levels = await lockShelves(trx, spots, taskId);
  const standing = await listReservations(trx, taskId);
  const by = personIdOf(ctx.actor);
  for (const { partId, quantity } of needs) {
    const spot = { partId, dockId: row.dock_id };
    const level = levels.get(spotKey(spot))!;
    const has = standing.filter((one) => one.part_id === partId).reduce((sum, one) => sum + one.quantity, 0);
    const more = computeReservation(
      quantity,
      has,
      computeFree({ onHand: level.on_hand, reserved: level.reserved }),
    );
    if (more === 0) continue;
    await releaseReservations(trx, { taskId, spot, at: ctx.now, by });
    await insertReservations(trx, [
      {
        task_id: taskId,
        part_id: partId,
        dock_id: row.dock_id,
        quantity: level.own + more,
        reserved_at: ctx.now,
        reserved_by: by,
        released_by: null,
      },
    ]);
  }
}
