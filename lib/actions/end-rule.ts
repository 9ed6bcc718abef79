import { findRule, lockRule, replaceRule } from '@/db/queries/rules';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { refuseField } from '@/lib/errors';
import type { EndRule, Rule } from '@/lib/schemas/rule';
import { accessRule, requireFleetWide } from './access';
import { enqueueRefresh } from './assess-again';
import { listCoveredUnits } from './covered-units';
import { toRule } from './shape-rule';

/**
 * Ends a rule: it and its closings are kept, it has no due points any more and holds no unit from this moment.
 * Managers of all docks only. Throws `conflict` on `id` when it has ended already.
 */
export async function endRule(ctx: Context, id: string, { reason }: EndRule): Promise<Rule> {
  requireFleetWide(ctx, 'rule.write');
  return runTransaction(ctx.db, async (trx) => {
    await lockRule(trx, id);
    const before = await accessRule({ ...ctx, db: trx }, id, 'rule.write');
    if (before.ended_at) throw refuseField('id', 'has ended already', 'conflict');
    const by = personIdOf(ctx.actor);
    await replaceRule(trx, id, { ended_at: ctx.now, ended_by: by, end_reason: reason || null });
    await enqueueRefresh(trx, await listCoveredUnits(trx, [before.scope]));
    return toRule((await findRule(trx, id))!, 0);
  });
}
