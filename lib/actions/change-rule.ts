import { findRule, hasDuties, lockRule, replaceRule, type NamedRuleRow } from '@/db/queries/rules';
import { lockScopes } from '@/db/queries/scopes';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { refuseField } from '@/lib/errors';
import type { ChangeRule, Rule } from '@/lib/schemas/rule';
import { accessRule, requireFleetWide } from './access';
import { assessAgain } from './assess-again';
import { checkRule } from './check-rule';
import { listCoveredUnits } from './covered-units';
import { RULE_NAME, refusingTaken } from './refusing-taken';
import { fromRule, toRule } from './shape-rule';

/**
 * Puts a rule in place of the one with this id, and has every unit assessed that the rule was for or is for now;
 * a change of words alone moves no due point and assesses nothing. Managers of all docks only. Throws `conflict`
 * on `revision` when somebody changed it since, on `name` when it is taken, on `id` when the rule has ended.
 */
export async function changeRule(ctx: Context, id: string, input: ChangeRule): Promise<Rule> {
  requireFleetWide(ctx, 'rule.write');
  return runTransaction(ctx.db, async (trx) => {
    const inside = { ...ctx, db: trx };
    await lockScopes(trx);
    await lockRule(trx, id);
    const before = await accessRule(inside, id, 'rule.write');
    checkCurrent(before, input.revision);
    await checkRule(inside, input);
    const row = fromRule(input);
    const moves = !(await hasDuties(trx, id, row));
    await refusingTaken(RULE_NAME, () =>
      replaceRule(trx, id, { ...row, changed_at: ctx.now, changed_by: personIdOf(ctx.actor) }),
    );
    if (moves) await assessAgain(trx, await listCoveredUnits(trx, [before.scope, input.appliesTo]));
    const covered = await listCoveredUnits(trx, [input.appliesTo]);
    return toRule((await findRule(trx, id))!, covered.length);
  });
}

function checkCurrent(row: NamedRuleRow, revision: number | undefined): void {
  if (row.ended_at) throw refuseField('id', 'has ended: open it again before changing it', 'conflict');
  if (revision === undefined || revision === row.revision) return;
  const who = row.changed_by_name ?? 'the system';
  const when = row.changed_at.toISOString();
  throw refuseField(
    'revision',
    `was changed by ${who} at ${when} while you edited. Load it again, then make your change.`,
    'conflict',
  );
}
