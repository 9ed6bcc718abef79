import { findRule, insertRule } from '@/db/queries/rules';
import { lockScopes } from '@/db/queries/scopes';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import type { CreateRule, Rule } from '@/lib/schemas/rule';
import { requireFleetWide } from './access';
import { assessAgain } from './assess-again';
import { checkRule } from './check-rule';
import { listCoveredUnits } from './covered-units';
import { RULE_NAME, refusingTaken } from './refusing-taken';
import { fromRule, toRule } from './shape-rule';

/**
 * Adds a rule and has every unit it is for assessed; until then they are held. Managers of all docks only.
 * Throws `conflict` on `name`, `invalid_input` on ids that name nothing.
 */
export async function createRule(ctx: Context, input: CreateRule): Promise<Rule> {
  requireFleetWide(ctx, 'rule.write');
  return runTransaction(ctx.db, async (trx) => {
    await lockScopes(trx);
    await checkRule({ ...ctx, db: trx }, input);
    const by = { changed_at: ctx.now, changed_by: personIdOf(ctx.actor) };
    const { id } = await refusingTaken(RULE_NAME, () =>
      insertRule(trx, { ...fromRule(input), ...by, created_at: ctx.now, created_by: by.changed_by }),
    );
    const unitIds = await listCoveredUnits(trx, [input.appliesTo]);
    await assessAgain(trx, unitIds);
    return toRule((await findRule(trx, id))!, unitIds.length);
  });
}
