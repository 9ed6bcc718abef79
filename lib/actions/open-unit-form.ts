import { listDocks } from '@/db/queries/docks';
import { listModels } from '@/db/queries/models';
import type { Context } from '@/lib/context';
import { canAtDock, visibleDocks } from '@/lib/domain/access';
import { localDay } from '@/lib/domain/calendar-day';
import type { UnitFormData } from '@/lib/schemas/fleet';
import { accessUnit, requireSomewhere } from './access';
import { toDock } from './shape-dock';
import { toUnit } from './shape-unit';

/**
 * What the form of a unit is drawn from, for a new one when `unitId` is null: the docks the actor may put it at.
 * Throws `not_found`, or `forbidden` to whoever may not save it.
 */
export async function openUnitForm(ctx: Context, unitId: string | null): Promise<UnitFormData> {
  requireSomewhere(ctx, 'unit.write');
  const unit = unitId ? await accessUnit(ctx, unitId, 'unit.write') : null;
  const [docks, models] = await Promise.all([listDocks(ctx.db, visibleDocks(ctx.actor)), listModels(ctx.db)]);
  const zone = unit?.time_zone ?? docks[0]?.time_zone ?? 'UTC';
  return {
    unit: unit && toUnit(unit),
    ownCarbCount: unit !== null && unit.carb_count_override !== null,
    docks: docks.filter((dock) => canAtDock(ctx.actor, 'unit.write', dock.id)).map(toDock),
    models: models.map(({ id, name, carb_count }) => ({ id, name, carbCount: carb_count })),
    today: localDay(ctx.now, zone),
  };
}
