import { findModel } from '@/db/queries/models';
import { insertReading } from '@/db/queries/readings';
import { getUnit, insertLiveMeter, insertUnit } from '@/db/queries/units';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { startOfLocalDay } from '@/lib/domain/calendar-day';
import { refuseField } from '@/lib/errors';
import type { CreateUnit, Unit } from '@/lib/schemas/unit';
import { toTenths } from '@/lib/schemas/schedule-shape';
import { accessDock } from './access';
import { assessAgain } from './assess-again';
import { checkCraftNumbers, UNIT_TAKEN } from './craft-numbers';
import { refusingTaken } from './refusing-taken';
import { toUnit } from './shape-unit';

/**
 * Adds a unit with its first reading, which is taken to be of the start of the day it entered service, or of now
 * when that is earlier. It is held as not yet assessed until the worker has computed its due points.
 * Managers of the dock only. Throws `not_found` on `modelId` or `dockId`, `invalid_input` on `hin` or
 * `registration`, `conflict` on `fleetNumber` or `hin` when another unit has it.
 */
export async function createUnit(ctx: Context, input: CreateUnit): Promise<Unit> {
  const dock = await accessDock(ctx, input.dockId, 'unit.write');
  if (!(await findModel(ctx.db, input.modelId)))
    throw refuseField('modelId', 'is no model of this fleet', 'not_found');
  const numbers = checkCraftNumbers(dock.craft_numbers, {
    hin: input.hin ?? null,
    registration: input.registration ?? null,
  });
  const entry = startOfLocalDay(input.enteredServiceOn, dock.time_zone);
  const first = { takenAt: entry < ctx.now ? entry : ctx.now, tenths: toTenths(input.engineHours) };
  const row = await refusingTaken(UNIT_TAKEN, () => insertWithMeter(ctx, input, numbers, first));
  return toUnit(row);
}

function insertWithMeter(
  ctx: Context,
  input: CreateUnit,
  numbers: { hin: string | null; registration: string | null },
  first: { takenAt: Date; tenths: number },
) {
  return runTransaction(ctx.db, async (trx) => {
    const by = personIdOf(ctx.actor);
    const { id } = await insertUnit(trx, {
      fleet_number: input.fleetNumber,
      model_id: input.modelId,
      dock_id: input.dockId,
      ...numbers,
      entered_service_on: input.enteredServiceOn,
      carb_count_override: input.carbCount ?? null,
      created_at: ctx.now,
      created_by: by,
    });
    const meter = { base_tenths: 0, shown_tenths: first.tenths };
    const reading = await insertReading(trx, {
      ...meter,
      unit_id: id,
      taken_at: first.takenAt,
      source: 'entry',
      recorded_at: ctx.now,
      recorded_by: by,
    });
    await insertLiveMeter(trx, {
      ...meter,
      unit_id: id,
      reading_id: reading.id,
      read_at: first.takenAt,
      engine_hours_tenths: first.tenths,
      starting_outings: input.outings ?? 0,
      outing_count: input.outings ?? 0,
    });
    await assessAgain(trx, [id]);
    return getUnit(trx, id);
  });
}
