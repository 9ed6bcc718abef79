import type { Transaction } from 'kysely';
import {
  findLastReturn,
  findOpenOuting,
  findOuting,
  insertOuting,
  type OutingRow,
} from '@/db/queries/outings';
import { listReadiness } from '@/db/queries/readiness';
import { countWrites, lockMeters, type LiveMeterRow, type UnitRow } from '@/db/queries/units';
import type { DB } from '@/db/tables';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { FUTURE_TOLERANCE_MS } from '@/lib/domain/meter';
import { describeMoment } from '@/lib/domain/moment-words';
import { Refusal, refuseField } from '@/lib/errors';
import type { CheckOut, CreateCheckOut } from '@/lib/schemas/check-out';
import { toHours, toTenths } from '@/lib/schemas/schedule-shape';
import { accessUnit, requireAtDock, type Checked } from './access';
import { settleInstant } from './keep-reading';
import { refusingTaken } from './refusing-taken';
import { toHolds } from './shape-readiness';

/** The longest a hire may be planned for. */
const LONGEST_HIRE_DAYS = 31;

/**
 * Hires a unit out. The id is the caller's: sending it again answers with the first result and writes nothing.
 * Throws `unit_out`, or `unit_held` with every reason, on `unitId`; a planned outing that would run past a hold is
 * one of the reasons. Throws `conflict` on `id` when another outing has it or on `unitId` when the unit is retired;
 * `invalid_input` on `at`, `dueBackAt` or `dockId`; `not_found`; `forbidden` at a dock the actor does not work at.
 */
export async function checkOut(ctx: Context, input: CreateCheckOut): Promise<CheckOut> {
  const row = await refusingTaken({ outing_pkey: ['id', 'Another outing has this id.'] }, () =>
    runTransaction(ctx.db, async (trx) => {
      const meter = (await lockMeters(trx, [input.unitId])).get(input.unitId)!;
      // Behind the lock: whoever moves or retires the unit holds it.
      const unit = await accessUnit({ ...ctx, db: trx }, input.unitId, 'outing.write', 'unitId');
      const first = await findOuting(trx, input.id);
      if (first) return sameUnit(first, input.unitId);
      const at = await checkFacts({ ...ctx, db: trx }, unit, meter, input);
      await countWrites(trx, [unit.id]);
      return insert(trx, ctx, unit, input, at);
    }),
  );
  return toCheckOut(row);
}

function sameUnit(first: OutingRow, unitId: string): OutingRow {
  if (first.unit_id === unitId && first.started_at) return first;
  throw refuseField('id', 'Another outing has this id.', 'conflict');
}

/** Everything that may forbid it, with the unit locked. Answers the instant it counts from. */
async function checkFacts(
  ctx: Context,
  unit: Checked<UnitRow>,
  meter: LiveMeterRow,
  input: CreateCheckOut,
): Promise<Date> {
  if (unit.retired_at) throw refuseField('unitId', 'The unit is retired.', 'conflict');
  if (input.dockId && input.dockId !== unit.dock_id) {
    requireAtDock(ctx, 'outing.write', input.dockId, 'dockId');
    throw refuseField('dockId', `Unit ${unit.fleet_number} is at ${unit.dock_name}.`);
  }
  const at = checkInstants(input, ctx.now, await lastSeen(ctx, meter), unit.time_zone);
  const out = await findOpenOuting(ctx.db, unit.id);
  if (out) {
    const since = out.started_at ? ` since ${describeMoment(out.started_at, unit.time_zone)}` : '';
    throw refuseField('unitId', `Unit ${unit.fleet_number} is out${since}.`, 'unit_out');
  }
  await refuseHeld(ctx, unit, input);
  return at;
}

/** When the unit was last known to be ashore: its last reading or return, whichever is later. */
async function lastSeen({ db }: Context, meter: LiveMeterRow): Promise<Date> {
  const returned = await findLastReturn(db, meter.unit_id);
  return returned && returned > meter.read_at ? returned : meter.read_at;
}

function checkInstants(input: CreateCheckOut, now: Date, seen: Date, timeZone: string): Date {
  let at = settleInstant(input.at, now);
  if (at > now) throw refuseField('at', 'This is in the future.');
  if (at < seen) {
    if (seen.getTime() - at.getTime() > FUTURE_TOLERANCE_MS)
      throw refuseField('at', `The unit was ashore on ${describeMoment(seen, timeZone)}, which is later.`);
    at = seen;
  }
  const { dueBackAt } = input;
  if (dueBackAt && dueBackAt <= at) throw refuseField('dueBackAt', 'This is not after the check-out.');
  if (dueBackAt && dueBackAt.getTime() - at.getTime() > LONGEST_HIRE_DAYS * 86_400_000)
    throw refuseField('dueBackAt', `A hire is at most ${LONGEST_HIRE_DAYS} days.`);
  return at;
}

async function refuseHeld(ctx: Context, unit: UnitRow, { plannedHours }: CreateCheckOut): Promise<void> {
  const [row] = await listReadiness(ctx.db, { unitId: unit.id }, ctx.now);
  if (!row) throw refuseField('unitId', 'The unit is retired.', 'conflict');
  const plannedTenths = plannedHours === undefined ? null : toTenths(plannedHours);
  const holds = toHolds(row, { at: ctx.now, onDay: null, plannedTenths });
  if (holds.length === 0) return;
  throw new Refusal(
    'unit_held',
    `Unit ${unit.fleet_number} may not go out. ${holds.map((hold) => hold.text).join(' ')}`,
    holds.map((hold) => ({ path: 'unitId', message: hold.text })),
  );
}

function insert(trx: Transaction<DB>, ctx: Context, unit: UnitRow, input: CreateCheckOut, at: Date) {
  return insertOuting(trx, {
    id: input.id,
    unit_id: unit.id,
    dock_id: unit.dock_id,
    started_at: at,
    checked_out_by: personIdOf(ctx.actor),
    due_back_at: input.dueBackAt ?? null,
    planned_tenths: input.plannedHours === undefined ? null : toTenths(input.plannedHours),
    renter_reference: input.renterReference ?? null,
  });
}

function toCheckOut(row: OutingRow): CheckOut {
  return {
    id: row.id,
    unitId: row.unit_id,
    dockId: row.dock_id,
    at: row.started_at!.toISOString(),
    dueBackAt: row.due_back_at?.toISOString() ?? null,
    plannedHours: row.planned_tenths === null ? null : toHours(row.planned_tenths),
    renterReference: row.renter_reference,
  };
}
