import { sql, type Insertable, type Kysely } from 'kysely';
import type { DB, ReadingTable } from '../tables';

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

export function findReading(db: Kysely<DB>, id: string) {
  return selectReadings(db).where('reading.id', '=', id).executeTakeFirst();
}

export function insertReading(db: Kysely<DB>, row: Insertable<ReadingTable>) {
  return db.insertInto('reading').values(row).returning('id').executeTakeFirstOrThrow();
}

/** What a check-in wrote, as it stood then: later check-ins are not counted in `outings`. */
export type CheckInRow = {
  unit_id: string;
  taken_at: Date;
  shown_tenths: number;
  engine_hours_tenths: number;
  ran_tenths: number;
  outings: number;
  outing_id: string;
  defect_id: string | null;
  review_code: 'unusual_jump' | 'late_arrival' | null;
};

/** What the check-in of this id wrote. Throws when there is none. */
export async function getCheckIn(db: Kysely<DB>, id: string): Promise<CheckInRow> {
  const { rows } = await sql<CheckInRow>`
    select r.unit_id, r.taken_at, r.shown_tenths, r.engine_hours_tenths, r.outing_id, r.review_code,
           r.engine_hours_tenths - coalesce((
             select p.engine_hours_tenths from reading p
              where p.unit_id = r.unit_id and p.taken_at <= r.taken_at and p.id <> r.id
                and (p.voided_at is null or p.voided_at > r.recorded_at)
                and not (p.source in ('swap_final', 'swap_first') and p.taken_at = r.taken_at)
              order by p.taken_at desc, p.engine_hours_tenths desc limit 1), r.engine_hours_tenths) as ran_tenths,
           m.starting_outings + (
             select count(*) from outing o
              where o.unit_id = r.unit_id and o.voided_at is null
                and (o.ended_at <= r.taken_at or o.id = r.outing_id))::int as outings,
           (select f.id from defect f where f.unit_id = r.unit_id and f.reading_id = r.id limit 1) as defect_id
      from reading r
      join live_meter m on m.unit_id = r.unit_id
     where r.id = ${id}`.execute(db);
  if (!rows[0]) throw new Error(`no check-in ${id}`);
  return rows[0];
}
