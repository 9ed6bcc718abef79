import {
  listUnitFacts,
  lockAssessments,
  replaceAssessments,
  replaceDuePoints,
  type DuePointToStore,
  type UnitFacts,
} from '@/db/queries/due-points';
import { listRules, type RuleRow } from '@/db/queries/rules';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { computeDuePoints, type Closing } from '@/lib/domain/due';
import { ruleApplies } from '@/lib/domain/rule';
import { openTasks } from './open-tasks';

/**
 * Computes the due points of these units anew from their facts, stores what changed, and opens the tasks that
 * have come within their rule's lead. Running it again changes nothing. Answers how many due points changed.
 */
export async function refreshDue(ctx: Context, { unitIds }: { unitIds: readonly string[] }): Promise<number> {
  return runTransaction(ctx.db, async (trx) => {
    await lockAssessments(trx, unitIds);
    const [units, rules] = [await listUnitFacts(trx, unitIds), await listRules(trx)];
    const changed = await replaceDuePoints(trx, unitIds, computeAll(units, rules));
    await replaceAssessments(trx, unitIds, ctx.now);
    await openTasks({ ...ctx, db: trx }, unitIds);
    return changed;
  });
}

/** Every due point of these units under the rules that apply to them. */
export function computeAll(units: readonly UnitFacts[], rules: readonly RuleRow[]): DuePointToStore[] {
  const points: DuePointToStore[] = [];
  for (const unit of units) {
    const closings = groupClosings(unit);
    for (const rule of rules) {
      if (!ruleApplies(rule.scope, unit)) continue;
      const schedule = { triggers: rule.triggers, lead: rule.lead, window: rule.tolerance };
      const history = { enteredServiceOn: unit.enteredServiceOn, closings: closings.get(rule.id) ?? [] };
      computeDuePoints(schedule, history).forEach((point, triggerIndex) => {
        if (point) points.push({ unitId: unit.id, ruleId: rule.id, triggerIndex, point });
      });
    }
  }
  return points;
}

function groupClosings(unit: UnitFacts): Map<string, Closing[]> {
  const byRule = new Map<string, Closing[]>();
  for (const [ruleId, on, engineHoursTenths, outings] of unit.closings ?? []) {
    const list = byRule.get(ruleId);
    if (list) list.push({ on, engineHoursTenths, outings });
    else byRule.set(ruleId, [{ on, engineHoursTenths, outings }]);
  }
  return byRule;
}
