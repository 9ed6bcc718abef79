import type { Transaction } from 'kysely';
import { getClosure, lockClosure, reverseClosureRow, type ClosureRow } from '@/db/queries/closures';
import { reopenDefect } from '@/db/queries/defects';
import { lockOtherOpenTask, lockTask, updateTask } from '@/db/queries/tasks';
import { lockUnits } from '@/db/queries/units';
import { runTransaction } from '@/db/transaction';
import type { DB } from '@/db/tables';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';

import { refuseField } from '@/lib/errors';
import type { Closure, ReverseClosure } from '@/lib/schemas/task';
import { accessClosure } from './access';
import { assessAgain } from './assess-again';
import { toClosure } from './shape-closure';
import { putPartsBack } from './take-parts';

/**
 * Takes a closure back: it stays on record with who reversed it and why, and no longer counts. The task is open
 * again, its defect too, and the unit is held as not yet assessed until the worker has brought the due points back.
 * A reading that the closing made stays; the parts it took are put back. Managers of the unit's dock only.
 * Throws `not_found`, `forbidden`, `conflict` when it is reversed already.
 */
export async function reverseClosure(ctx: Context, id: string, { reason }: ReverseClosure): Promise<Closure> {
  const seen = await accessClosure(ctx, id, 'closure.reverse');
  await runTransaction(ctx.db, async (trx) => {
    await lockUnits(trx, [seen.unit_id]);
    const closure = await lockClosure(trx, id);
    if (closure.reversed_at) throw refuseField('id', 'is reversed already', 'conflict');
    await reverseClosureRow(trx, id, {
      reversed_at: ctx.now,
      reversed_by: personIdOf(ctx.actor),
      reverse_reason: reason,
    });
    await reopenTask(ctx, trx, seen);
    await putPartsBack(ctx, trx, { closureId: id, reason });
    await assessAgain(trx, [seen.unit_id]);
  });
  return toClosure(await getClosure(ctx.db, id));
}

/**
 * Opens the closed task again. Where the rule has opened its next one since, one of the two gives way: the next,
 * unless somebody has begun, planned or noted it.
 */
async function reopenTask(ctx: Context, trx: Transaction<DB>, closure: ClosureRow): Promise<void> {
  const task = await lockTask(trx, closure.task_id);
  const by = personIdOf(ctx.actor);
  if (task.defect_id) await reopenDefect(trx, task.defect_id);
  const next = task.rule_id ? await lockOtherOpenTask(trx, { ...task, rule_id: task.rule_id }) : undefined;
  if (next && (next.started_at || next.planned_on || next.has_notes)) {
    await updateTask(trx, task.id, {
      withdrawn_by: by,
      withdraw_reason: 'Its closing was reversed; the work goes on in the next task of the rule.',
    });
    return;
  }
  if (next)
    await updateTask(trx, next.id, {
      ended_at: ctx.now,
      withdrawn_by: by,
      withdraw_reason: 'The closing before it was reversed.',
    });
  await updateTask(trx, task.id, { ended_at: null });
}
