import { listBaselines as listBaselineRows } from '@/db/queries/baselines';
import type { Context } from '@/lib/context';
import type { Baseline } from '@/lib/schemas/baseline';
import { accessUnit } from './access';
import { toBaseline } from './shape-baseline';

/** The baselines of a unit, withdrawn ones too, by rule and the latest first. Throws `not_found` on `id`. */
export async function listBaselines(ctx: Context, unitId: string): Promise<Baseline[]> {
  const unit = await accessUnit(ctx, unitId, 'unit.read');
  return (await listBaselineRows(ctx.db, unit.id)).map(toBaseline);
}
