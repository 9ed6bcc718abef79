import { replaceTaskNeed } from '@/db/queries/reservations';
import { getTaskStanding, lockTask } from '@/db/queries/tasks';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { refuseField } from '@/lib/errors';
import type { SayNeed, TaskParts } from '@/lib/schemas/task-parts';
import { accessPart, accessTask } from './access';
import { getTaskParts } from './get-task-parts';
import { refuseEnded } from './refuse-ended';

/**
 * Says how many of a part a task needs, in place of what its rule asks for. Managers and mechanics of its dock.
 * Throws `not_found` on `partId`, `conflict` when the task has ended and on `partId` for a part that is retired.
 */
export async function sayNeed(ctx: Context, taskId: string, input: SayNeed): Promise<TaskParts> {
  await accessTask(ctx, taskId, 'task.write');
  const part = await accessPart(ctx, input.partId, 'part.read', 'partId');
  if (part.retired_at && input.quantity > 0) throw refuseField('partId', 'is retired', 'conflict');
  await runTransaction(ctx.db, async (trx) => {
    const task = await lockTask(trx, taskId);
    if (task.ended_at) throw refuseEnded(await getTaskStanding(trx, taskId));
    await replaceTaskNeed(trx, {
      task_id: taskId,
      part_id: input.partId,
      quantity: input.quantity,
      said_at: ctx.now,
      said_by: personIdOf(ctx.actor),
    });
  });
  return getTaskParts(ctx, taskId);
}
