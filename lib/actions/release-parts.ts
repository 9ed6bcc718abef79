import { releaseReservations } from '@/db/queries/reservations';
import { lockTask } from '@/db/queries/tasks';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import type { TaskParts } from '@/lib/schemas/task-parts';
import { accessTask } from './access';
import { getTaskParts } from './get-task-parts';

/** Releases all that is set aside for a task. Managers and mechanics of its dock. */
export async function releaseParts(ctx: Context, taskId: string): Promise<TaskParts> {
  await accessTask(ctx, taskId, 'task.write');
  await runTransaction(ctx.db, async (trx) => {
    await lockTask(trx, taskId);
    await releaseReservations(trx, { taskId, at: ctx.now, by: personIdOf(ctx.actor) });
  });
  return getTaskParts(ctx, taskId);
}
