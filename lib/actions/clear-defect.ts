import { clearDefect as markCleared, findDefect, withdrawDefectTask } from '@/db/queries/defects';
import { lockUnits } from '@/db/queries/units';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { refuseField } from '@/lib/errors';
import type { ClearDefect, Defect } from '@/lib/schemas/defect';
import { accessDefect } from './access';
import { toDefect } from './shape-defect';

/**
 * Says that a defect is gone, or was none; a repair opened for it that nobody has begun is withdrawn. Managers and
 * mechanics of the dock. Throws `not_found`, `forbidden`, and `conflict` on `id` when it is cleared already.
 */
export async function clearDefect(ctx: Context, id: string, input: ClearDefect): Promise<Defect> {
  const defect = await accessDefect(ctx, id, 'defect.clear');
  const by = personIdOf(ctx.actor);
  return runTransaction(ctx.db, async (trx) => {
    await lockUnits(trx, [defect.unit_id]);
    if (!(await markCleared(trx, defect.id, { at: ctx.now, by, note: input.note })))
      throw refuseField('id', 'This defect is cleared already.', 'conflict');
    await withdrawDefectTask(trx, defect.id, {
      at: ctx.now,
      by,
      reason: `The defect was cleared: ${input.note}`,
    });
    return toDefect((await findDefect(trx, defect.id))!);
  });
}
