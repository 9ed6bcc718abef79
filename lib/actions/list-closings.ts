import { listClosingsOf } from '@/db/queries/due-points';
import type { Context } from '@/lib/context';
import type { ClosingShape } from '@/lib/schemas/closing';
import { toHours } from '@/lib/schemas/schedule-shape';
import { accessUnit } from './access';

/**
 * When a rule's work was done on a unit, in the order its due points are computed from: closures that stand and
 * baselines that stand. Throws `not_found` on `id`.
 */
export async function listClosings(
  ctx: Context,
  unitId: string,
  { ruleId }: { ruleId: string },
): Promise<ClosingShape[]> {
  const unit = await accessUnit(ctx, unitId, 'unit.read');
  const closings = await listClosingsOf(ctx.db, unit.id, ruleId);
  return closings.map(({ closed_on: on, engine_hours_tenths: tenths, outings }) => ({
    on,
    engineHours: toHours(tenths),
    outings,
  }));
}
