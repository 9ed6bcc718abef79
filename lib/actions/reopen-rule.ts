import { findRule, lockRule, replaceRule } from '@/db/queries/rules';
import { lockScopes } from '@/db/queries/scopes';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { refuseField } from '@/lib/errors';
import type { Rule } from '@/lib/schemas/rule';
import { accessRule, requireFleetWide } from './access';
import { assessAgain } from './assess-again';
import { listCoveredUnits } from './covered-units';
import { RULE_NAME, refusingTaken } from './refusing-taken';
import { toRule } from './shape-rule';

/**
 * Puts an ended rule in force again, with all that was done under it. Managers of all docks only. Throws
 * `conflict` on `id` when it has not ended, on `name` when another rule has taken its name.
 */
export async function reopenRule(ctx: Context, id: string): Promise<Rule> {
  requireFleetWide(ctx, 'rule.write');
  return runTransaction(ctx.db, async (trx) => {
    await lockScopes(trx);
    await lockRule(trx, id);
    const before = await accessRule({ ...ctx, db: trx }, id, 'rule.write');
    if (!before.ended_at) throw refuseField('id', 'has not ended', 'conflict');
    const cleared = { ended_at: null, ended_by: null, end_reason: null };
    const by = { changed_at: ctx.now, changed_by: personIdOf(ctx.actor) };
    await refusingTaken(RULE_NAME, () => replaceRule(trx, id, { ...cleared, ...by }));
    const unitIds = await listCoveredUnits(trx, [before.scope]);
    await assessAgain(trx, unitIds);
    return toRule((await findRule(trx, id))!, unitIds.length);
  });
}
