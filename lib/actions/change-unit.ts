import type { Updateable } from 'kysely';
import { findModel } from '@/db/queries/models';
import { findOpenOuting } from '@/db/queries/outings';
import { getUnit, lockUnits, updateUnit, type UnitRow } from '@/db/queries/units';
import type { UnitTable } from '@/db/tables';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { mergeSpecs, type Specs } from '@/lib/domain/measurement';
import { describeMoment } from '@/lib/domain/moment-words';
import { refuseField } from '@/lib/errors';
import type { ChangeUnit, Unit } from '@/lib/schemas/unit';
import { accessDock, accessUnit, type Checked } from './access';
import { assessAgain, enqueueRefresh } from './assess-again';
import { checkCraftNumbers, UNIT_TAKEN } from './craft-numbers';
import { refusingTaken } from './refusing-taken';
import { toUnit } from './shape-unit';

/**
 * Changes what is named of a unit, or retires it for good. What decides which rules are for it, or when they are
 * first due, has it assessed again. Managers of its dock, and of the one it goes to.
 * Throws `not_found`, `forbidden`, `conflict` on `id` for a retired unit, on `fleetNumber` or `hin` when another unit
 * has it; `unit_out` on `retired` or `dockId` while it is out; `invalid_input` on `hin`, `registration` or `specs`.
 */
export async function changeUnit(ctx: Context, id: string, input: ChangeUnit): Promise<Unit> {
  return refusingTaken(UNIT_TAKEN, () =>
    runTransaction(ctx.db, async (trx) => {
      await lockUnits(trx, [id]);
      const locked = { ...ctx, db: trx };
      const before = await accessUnit(locked, id, 'unit.write');
      if (before.retired_at) throw refuseField('id', 'The unit is retired.', 'conflict');
      const change = await toChange(locked, before, input);
      if (input.retired || (change.dock_id ?? before.dock_id) !== before.dock_id)
        await refuseOut(locked, before, input.retired ? 'retired' : 'dockId');
      await updateUnit(trx, before.id, change);
      if (input.retired) await enqueueRefresh(trx, [before.id]);
      else if (changesDuties(before, change)) await assessAgain(trx, [before.id]);
      return toUnit(await getUnit(trx, before.id));
    }),
  );
}

type Change = Updateable<UnitTable>;

async function toChange(ctx: Context, before: Checked<UnitRow>, input: ChangeUnit): Promise<Change> {
  const dock = await accessDock(ctx, input.dockId ?? before.dock_id, 'unit.write');
  const model = await findModel(ctx.db, input.modelId ?? before.model_id);
  if (!model) throw refuseField('modelId', 'is no model of this fleet', 'not_found');
  if (input.specs) checkSpecs(mergeSpecs(model.specs, input.specs));
  const numbers = {
    hin: input.hin === undefined ? before.hin : input.hin,
    registration: input.registration === undefined ? before.registration : input.registration,
  };
  const changesNumbers = [input.hin, input.registration, input.dockId].some((value) => value !== undefined);
  return {
    ...(input.dockId !== undefined && { dock_id: dock.id }),
    ...(changesNumbers && checkCraftNumbers(dock.craft_numbers, numbers)),
    ...(input.fleetNumber !== undefined && { fleet_number: input.fleetNumber }),
    ...(input.modelId !== undefined && { model_id: input.modelId }),
    ...(input.enteredServiceOn !== undefined && { entered_service_on: input.enteredServiceOn }),
    ...(input.carbCount !== undefined && { carb_count_override: input.carbCount }),
    ...(input.specs && { specs: JSON.stringify(input.specs) }),
    ...(input.retired && { retired_at: ctx.now, retired_by: personIdOf(ctx.actor) }),
  };
}

/** Limits of a unit's own must fit those that it keeps of its model. */
function checkSpecs(merged: Specs): void {
  for (const [name, { min, max }] of Object.entries(merged))
    if (min !== undefined && max !== undefined && max < min)
      throw refuseField(
        `specs.${name}.max`,
        `with those of its model: the most, ${max}, is below the least, ${min}`,
      );
}

async function refuseOut(ctx: Context, unit: UnitRow, path: string): Promise<void> {
  const out = await findOpenOuting(ctx.db, unit.id);
  if (!out) return;
  const since = out.started_at ? ` since ${describeMoment(out.started_at, unit.time_zone)}` : '';
  throw refuseField(path, `Unit ${unit.fleet_number} is out${since}. Check it in first.`, 'unit_out');
}

function changesDuties(before: UnitRow, change: Change): boolean {
  const { model_id, dock_id, entered_service_on, carb_count_override } = { ...before, ...change };
  return (
    model_id !== before.model_id ||
    dock_id !== before.dock_id ||
    entered_service_on !== before.entered_service_on ||
    carb_count_override !== before.carb_count_override
  );
}
