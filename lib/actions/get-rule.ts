import { listScopedUnits } from '@/db/queries/scopes';
import type { Context } from '@/lib/context';
import { visibleDocks } from '@/lib/domain/access';
import { ruleApplies } from '@/lib/domain/rule';
import type { Rule } from '@/lib/schemas/rule';
import { accessRule } from './access';
import { toRule } from './shape-rule';

/** The rule, with how many units of the docks the actor works at it covers. Throws `not_found` on `id`. */
export async function getRule(ctx: Context, id: string): Promise<Rule> {
  const row = await accessRule(ctx, id, 'rule.read');
  const units = await listScopedUnits(ctx.db, visibleDocks(ctx.actor));
  const covered = row.ended_at ? 0 : units.filter((unit) => ruleApplies(row.scope, unit)).length;
  return toRule(row, covered);
}
