import { findSignOff, withdrawSignOffs } from '@/db/queries/bench';
import { getTaskStanding, lockTask } from '@/db/queries/tasks';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { refuseField } from '@/lib/errors';
import type { Work } from '@/lib/schemas/work';
import { accessTask, requireAtDock } from './access';
import { getWork } from './get-work';
import { refuseEnded } from './refuse-ended';

/**
 * Takes a signature back before the task is closed: whoever signed, or a manager of the dock. Throws `not_found`,
 * `forbidden`, `conflict` when the task has ended.
 */
export async function withdrawSignOff(ctx: Context, taskId: string, id: string): Promise<Work> {
  const seen = await accessTask(ctx, taskId, 'closure.write');
  const by = personIdOf(ctx.actor);
  await runTransaction(ctx.db, async (trx) => {
    const task = await lockTask(trx, taskId);
    const row = await findSignOff(trx, id);
    if (!row || row.task_id !== taskId)
      throw refuseField('signOffId', 'is no signature of this task', 'not_found');
    if (row.withdrawn_at) return;
    if (task.ended_at) throw refuseEnded(await getTaskStanding(trx, taskId));
    if (row.signed_by !== by) requireAtDock(ctx, 'closure.reverse', seen.dock_id);
    await withdrawSignOffs(trx, { taskId, kind: row.kind, at: ctx.now, by });
  });
  return getWork(ctx, taskId);
}
