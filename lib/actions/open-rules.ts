import type { Context } from '@/lib/context';
import { canFleetWide } from '@/lib/domain/access';
import type { ListedRule } from '@/lib/schemas/rule';
import { listRules } from './list-rules';

/** What the screen of all rules is drawn from: as `listRules`, and whether the actor may write one. */
export async function openRules(
  ctx: Context,
  query: { ended?: 'include' },
): Promise<{ rules: ListedRule[]; mayWrite: boolean }> {
  return { rules: await listRules(ctx, query), mayWrite: canFleetWide(ctx.actor, 'rule.write') };
}
