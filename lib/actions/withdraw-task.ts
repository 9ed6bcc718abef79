import { clearDefect } from '@/db/queries/defects';
import { releaseReservations } from '@/db/queries/reservations';
import { getTaskStanding, lockTask, updateTask, type TaskStandingRow } from '@/db/queries/tasks';
import { lockUnits } from '@/db/queries/units';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { refuseField } from '@/lib/errors';
import type { TaskPage, WithdrawTask } from '@/lib/schemas/task';
import { accessTask } from './access';
import { getTask } from './get-task';
import { refuseEnded } from './refuse-ended';
import { toTask } from './shape-task';

/**
 * Ends a task that will not be done. A defect's task takes its defect with it, cleared with the same reason.
 * Throws `conflict` for a task that has ended, and for a rule's task that is within its lead: it would come back.
 */
export async function withdrawTask(ctx: Context, id: string, { reason }: WithdrawTask): Promise<TaskPage> {
  const seen = await accessTask(ctx, id, 'task.write');
  await runTransaction(ctx.db, async (trx) => {
    await lockUnits(trx, [seen.unit_id]);
    const task = await lockTask(trx, id);
    const standing = await getTaskStanding(trx, id);
    if (task.ended_at) throw refuseEnded(standing);
    refuseWhileDue(ctx, standing);
    const by = personIdOf(ctx.actor);
    await updateTask(trx, id, { ended_at: ctx.now, withdrawn_by: by, withdraw_reason: reason });
    await releaseReservations(trx, { taskId: id, at: ctx.now, by });
    if (task.defect_id)
      await clearDefect(trx, task.defect_id, { at: ctx.now, by, note: `Withdrawn: ${reason}` });
  });
  return getTask(ctx, id);
}

function refuseWhileDue(ctx: Context, row: TaskStandingRow): void {
  if (row.origin !== 'rule' || row.rule_ended_at !== null) return;
  const { state } = toTask(row, ctx.now);
  if (state === null || state === 'clear') return;
  throw refuseField(
    'id',
    `This comes from a rule and is ${state}: withdrawn, it would come back by itself. Close it when it is done, or ask a manager to change the rule.`,
    'conflict',
  );
}
