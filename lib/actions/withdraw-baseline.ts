import { findBaseline, withdrawBaseline as withdrawBaselineRow } from '@/db/queries/baselines';
import { lockUnits } from '@/db/queries/units';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { refuseField } from '@/lib/errors';
import type { Baseline } from '@/lib/schemas/baseline';
import { accessUnit } from './access';
import { assessAgain } from './assess-again';
import { toBaseline } from './shape-baseline';

/**
 * Withdraws a baseline that was a mistake; it is kept, with who and when, and the unit is assessed again. Managers
 * of the dock. Throws `not_found` on `baselineId`, or `conflict` when it was withdrawn already.
 */
export async function withdrawBaseline(ctx: Context, unitId: string, baselineId: string): Promise<Baseline> {
  return runTransaction(ctx.db, async (trx) => {
    await lockUnits(trx, [unitId]);
    const unit = await accessUnit({ ...ctx, db: trx }, unitId, 'baseline.withdraw');
    const row = await findBaseline(trx, baselineId);
    if (row?.unit_id !== unit.id) throw refuseField('baselineId', 'is no baseline of this unit', 'not_found');
    const by = { withdrawn_at: ctx.now, withdrawn_by: personIdOf(ctx.actor) };
    if (!(await withdrawBaselineRow(trx, row.id, by)))
      throw refuseField('baselineId', 'was withdrawn already', 'conflict');
    await assessAgain(trx, [unit.id]);
    return toBaseline((await findBaseline(trx, row.id))!);
  });
}
