import {
  sql,
  type Insertable,
  type Kysely,
  type Selectable,
  type Transaction,
  type Updateable,
} from 'kysely';
import type { DB, LiveMeterTable, UnitTable } from '../tables';

/** A unit with what its model, dock and live meter say of it. */
export type UnitRow = Awaited<ReturnType<typeof getUnit>>;
export type LiveMeterRow = Selectable<LiveMeterTable>;

function selectUnits(db: Kysely<DB>) {
  return db
    .selectFrom('unit')
    .innerJoin('model', 'model.id', 'unit.model_id')
    .innerJoin('dock', 'dock.id', 'unit.dock_id')
    .innerJoin('live_meter', 'live_meter.unit_id', 'unit.id')
    .selectAll('unit')
    .select([
      'model.name as model_name',
      'model.propulsion',
      'model.stroke',
      'model.engines',
      'model.cylinders',
      'dock.name as dock_name',
      'dock.time_zone',
      'dock.craft_numbers',
      'live_meter.engine_hours_tenths',
      'live_meter.shown_tenths',
      'live_meter.base_tenths',
      'live_meter.outing_count',
      'live_meter.read_at',
      sql<number>`coalesce(unit.carb_count_override, model.carb_count)`.as('carb_count'),
    ]);
}

/** The unit of this id, retired or not. */
export function findUnit(db: Kysely<DB>, id: string) {
  return selectUnits(db).where('unit.id', '=', id).executeTakeFirst();
}

/** The unit of this id, retired or not. Throws when there is none. */
export function getUnit(db: Kysely<DB>, id: string) {
  return selectUnits(db).where('unit.id', '=', id).executeTakeFirstOrThrow();
}

/** The units of these docks by fleet number, retired ones left out. */
export function listUnits(db: Kysely<DB>, dockIds: 'all' | readonly string[]): Promise<UnitRow[]> {
  const query = selectUnits(db).where('unit.retired_at', 'is', null).orderBy('unit.fleet_number');
  return (dockIds === 'all' ? query : query.where('unit.dock_id', 'in', [...dockIds])).execute();
}

/** The ids of all units that are not retired, in order. */
export async function listUnitIds(db: Kysely<DB>): Promise<string[]> {
  const rows = await db
    .selectFrom('unit')
    .select('id')
    .where('retired_at', 'is', null)
    .orderBy('id')
    .execute();
  return rows.map((row) => row.id);
}

/** The retired units of these docks by fleet number. */
export function listRetiredUnits(db: Kysely<DB>, dockIds: 'all' | readonly string[]): Promise<UnitRow[]> {
  const query = selectUnits(db).where('unit.retired_at', 'is not', null).orderBy('unit.fleet_number');
  return (dockIds === 'all' ? query : query.where('unit.dock_id', 'in', [...dockIds])).execute();
}

/**
 * Stores a unit, without its meter; answers its id. The index `unit_fleet_number` keeps fleet numbers apart, in any
 * case, and `unit_hin` the hull numbers of units that are not retired.
 */
export function insertUnit(db: Kysely<DB>, row: Insertable<UnitTable>) {
  return db.insertInto('unit').values(row).returning('id').executeTakeFirstOrThrow();
}

/**
 * Locks units against every other writer of their facts, in order of id so that two writers cannot wait for each
 * other, and counts the write on each meter. Answers the live meters as they were.
 */
export async function lockUnits(
  trx: Transaction<DB>,
  ids: readonly string[],
): Promise<Map<string, LiveMeterRow>> {
  const meters = await lockMeters(trx, ids);
  await countWrites(trx, ids);
  return meters;
}

/** Locks as `lockUnits` does without counting a write, for whoever may find that there is nothing to write. */
export async function lockMeters(
  trx: Transaction<DB>,
  ids: readonly string[],
): Promise<Map<string, LiveMeterRow>> {
  const rows = await trx
    .selectFrom('live_meter')
    .selectAll()
    .where('unit_id', 'in', [...ids])
    .orderBy('unit_id')
    .forUpdate()
    .execute();
  return new Map(rows.map((row) => [row.unit_id, row]));
}

/** Tells every writer who has read these units' facts without a lock that they have changed. */
export async function countWrites(trx: Transaction<DB>, ids: readonly string[]): Promise<void> {
  await trx
    .updateTable('live_meter')
    .set((eb) => ({ revision: eb('revision', '+', 1) }))
    .where('unit_id', 'in', [...ids])
    .execute();
}

/** Stores where the meters of a new unit stand. */
export function insertLiveMeter(trx: Transaction<DB>, row: Insertable<LiveMeterTable>) {
  return trx.insertInto('live_meter').values(row).execute();
}

/** Changes what is named of a unit. Lock it first. */
export function updateUnit(trx: Transaction<DB>, id: string, row: Updateable<UnitTable>) {
  return trx.updateTable('unit').set(row).where('id', '=', id).execute();
}
