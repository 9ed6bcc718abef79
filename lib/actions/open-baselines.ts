import type { Context } from '@/lib/context';
import { canAtDock } from '@/lib/domain/access';
import type { UnitBaselines } from '@/lib/schemas/baseline';
import { accessUnit } from './access';
import { listBaselines } from './list-baselines';
import { listDuePoints } from './list-due-points';

/** What the screen of a unit's baselines is drawn from: every rule it is for, and what was recorded. Throws `not_found`. */
export async function openBaselines(ctx: Context, unitId: string): Promise<UnitBaselines> {
  const unit = await accessUnit(ctx, unitId, 'unit.read');
  const [standing, baselines] = await Promise.all([listDuePoints(ctx, unit.id), listBaselines(ctx, unit.id)]);
  return {
    unit: { id: unit.id, fleetNumber: unit.fleet_number, dockName: unit.dock_name },
    standing,
    baselines,
    mayRecord: canAtDock(ctx.actor, 'baseline.write', unit.dock_id),
    mayWithdraw: canAtDock(ctx.actor, 'baseline.withdraw', unit.dock_id),
  };
}
