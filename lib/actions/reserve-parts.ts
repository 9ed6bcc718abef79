import { getTaskStanding, lockTask } from '@/db/queries/tasks';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import type { TaskParts } from '@/lib/schemas/task-parts';
import { accessTask } from './access';
import { getTaskParts } from './get-task-parts';
import { refuseEnded } from './refuse-ended';
import { reserveNeeds } from './reserve-needs';

/**
 * Sets aside for a task what it needs, as far as it is free at its unit's dock. Managers and mechanics of the dock.
 * Throws `conflict` when the task has ended.
 */
export async function reserveParts(ctx: Context, taskId: string): Promise<TaskParts> {
  await accessTask(ctx, taskId, 'task.write');
  await runTransaction(ctx.db, async (trx) => {
    const task = await lockTask(trx, taskId);
    if (task.ended_at) throw refuseEnded(await getTaskStanding(trx, taskId));
    await reserveNeeds(ctx, trx, taskId);
  });
  return getTaskParts(ctx, taskId);
}
