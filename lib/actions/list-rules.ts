import { listNamedRules, listRuleStates } from '@/db/queries/rules';
import { listScopedUnits } from '@/db/queries/scopes';
import type { Context } from '@/lib/context';
import { visibleDocks } from '@/lib/domain/access';
import { ruleApplies } from '@/lib/domain/rule';
import type { ListedRule } from '@/lib/schemas/rule';
import { requireFleetWide } from './access';
import { toRule } from './shape-rule';

const NONE = { overdue: 0, due: 0, upcoming: 0 };

/**
 * The rules by name, those in force first, ended ones when asked for. Units are counted at the docks the actor
 * works at; an ended rule covers none.
 */
export async function listRules(ctx: Context, { ended }: { ended?: 'include' } = {}): Promise<ListedRule[]> {
  requireFleetWide(ctx, 'rule.read');
  const docks = visibleDocks(ctx.actor);
  const rows = await listNamedRules(ctx.db, { ended: ended === 'include' });
  const units = await listScopedUnits(ctx.db, docks);
  const states = new Map(
    (await listRuleStates(ctx.db, docks, ctx.now)).map(({ rule_id, ...counts }) => [rule_id, counts]),
  );
  return rows.map((row) => {
    const covered = row.ended_at ? 0 : units.filter((unit) => ruleApplies(row.scope, unit)).length;
    return { ...toRule(row, covered), states: (!row.ended_at && states.get(row.id)) || NONE };
  });
}
