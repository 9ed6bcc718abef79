import { insertReservations, releaseReservations } from '@/db/queries/reservations';
import { lockShelves, spotKey } from '@/db/queries/stock';
import { getTaskStanding, lockTask } from '@/db/queries/tasks';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { computeFree } from '@/lib/domain/stock';
import { refuseField } from '@/lib/errors';
import type { SetReservation, TaskParts } from '@/lib/schemas/task-parts';
import { accessDock, accessPart, accessTask } from './access';
import { getTaskParts } from './get-task-parts';
import { refuseEnded } from './refuse-ended';

/**
 * Sets so many of a part aside for a task at a dock, its unit's unless another is named; 0 releases them. Managers
 * and mechanics of the task's dock and of that one. Throws `not_found` on `partId` or `dockId`, `conflict` when the
 * task has ended and on `quantity` when fewer are free.
 */
export async function setReservation(
  ctx: Context,
  taskId: string,
  input: SetReservation,
): Promise<TaskParts> {
  const seen = await accessTask(ctx, taskId, 'task.write');
  await accessPart(ctx, input.partId, 'part.read', 'partId');
  const dock = await accessDock(ctx, input.dockId ?? seen.dock_id, 'stock.write');
  const spot = { partId: input.partId, dockId: dock.id };
  const by = personIdOf(ctx.actor);
  await runTransaction(ctx.db, async (trx) => {
    const task = await lockTask(trx, taskId);
    if (task.ended_at) throw refuseEnded(await getTaskStanding(trx, taskId));
    const level = (await lockShelves(trx, [spot], taskId)).get(spotKey(spot))!;
    if (input.quantity === level.own) return;
    const free = computeFree({ onHand: level.on_hand, reserved: level.reserved - level.own });
    if (input.quantity > Math.max(free, level.own))
      throw refuseField('quantity', `is more than the ${free} that are free at ${dock.name}`, 'conflict');
    await releaseReservations(trx, { taskId, spot, at: ctx.now, by });
    if (input.quantity > 0)
      await insertReservations(trx, [
        {
          task_id: taskId,
          part_id: spot.partId,
          dock_id: spot.dockId,
          quantity: input.quantity,
          reserved_at: ctx.now,
          reserved_by: by,
          released_by: null,
        },
      ]);
  });
  return getTaskParts(ctx, taskId);
}
