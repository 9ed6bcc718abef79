import { sql, type Insertable, type Kysely, type Transaction } from 'kysely';
import type { DB, ReadingTable } from '../tables';
import { LATEST_FIRST } from './reading-order';

/** A reading with what its unit says of it. */
export type ReadingRow = NonNullable<Awaited<ReturnType<typeof findReading>>>;

function selectReadings(db: Kysely<DB>) {
  return db
    .selectFrom('reading')
    .innerJoin('unit', 'unit.id', 'reading.unit_id')
    .innerJoin('dock', 'dock.id', 'unit.dock_id')
    .leftJoin('person as recorder', 'recorder.id', 'reading.recorded_by')
    .selectAll('reading')
    .select([
      'unit.fleet_number',
      'unit.dock_id',
      'dock.name as dock_name',
      'dock.time_zone',
      'recorder.name as recorder_name',
    ]);
}

/** The reading of this id, void or not. */
export function findReading(db: Kysely<DB>, id: string) {
  return selectReadings(db).where('reading.id', '=', id).executeTakeFirst();
}

/** Stores a reading; answers its id. It does not move the live meter. */
export function insertReading(db: Kysely<DB>, row: Insertable<ReadingTable>) {
  return db.insertInto('reading').values(row).returning('id').executeTakeFirstOrThrow();
}

/** Marks these readings void. Answers how many were not void already. */
export async function voidReadings(
  trx: Transaction<DB>,
  ids: readonly string[],
  voided: { at: Date; by: string | null; reason: string },
): Promise<number> {
  const rows = await trx
    .updateTable('reading')
    .set({ voided_at: voided.at, voided_by: voided.by, void_reason: voided.reason })
    .where('id', 'in', [...ids])
    .where('voided_at', 'is', null)
    .returning('id')
    .execute();
  return rows.length;
}

/** The readings of a unit from an instant on that are not void, the earliest first, at most 10. */
export function listReadingsFrom(db: Kysely<DB>, unitId: string, from: Date) {
  return db
    .selectFrom('reading')
    .select(['id', 'taken_at', 'shown_tenths', 'source', 'outing_id'])
    .where('unit_id', '=', unitId)
    .where('voided_at', 'is', null)
    .where('taken_at', '>=', from)
    .orderBy('taken_at')
    .orderBy('engine_hours_tenths')
    .limit(10)
    .execute();
}

/**
 * Sets the unit's live meter to what its readings and outings say that are not void. The unit must be locked.
 */
export async function recountLiveMeter(trx: Transaction<DB>, unitId: string): Promise<void> {
  await sql`
    update live_meter m set
      reading_id = last.id, read_at = last.taken_at, base_tenths = last.base_tenths,
      shown_tenths = last.shown_tenths, engine_hours_tenths = last.engine_hours_tenths,
      outing_count = m.starting_outings + (
        select count(*) from outing o
         where o.unit_id = ${unitId} and o.voided_at is null and o.ended_at is not null)::int
      from (
        select r.* from reading r
         where r.unit_id = ${unitId} and r.voided_at is null
         order by ${LATEST_FIRST} limit 1) last
     where m.unit_id = ${unitId}`.execute(trx);
}

/** Marks the reading reviewed, if it waits for it. Answers whether it did. */
export async function reviewReading(
  db: Kysely<DB>,
  id: string,
  reviewed: { at: Date; by: string | null; note: string | null },
): Promise<boolean> {
  const row = await db
    .updateTable('reading')
    .set({ reviewed_at: reviewed.at, reviewed_by: reviewed.by, review_note: reviewed.note })
    .where('id', '=', id)
    .where('review_code', 'is not', null)
    .where('reviewed_at', 'is', null)
    .where('voided_at', 'is', null)
    .returning('id')
    .executeTakeFirst();
  return row !== undefined;
}
