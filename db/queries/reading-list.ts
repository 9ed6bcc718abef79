import { sql, type Kysely, type RawBuilder } from 'kysely';
import type { DB, ReadingTable } from '../tables';

/** A reading as a list shows it, with the one before it that is not void. */
export type ListedReading = {
  id: string;
  unit_id: string;
  fleet_number: string;
  dock_id: string;
  dock_name: string;
  time_zone: string;
  taken_at: Date;
  source: ReadingTable['source'];
  engine_hours_tenths: number;
  shown_tenths: number;
  previous_at: Date | null;
  previous_tenths: number | null;
  outing_id: string | null;
  outing_started_at: Date | null;
  recorded_at: Date;
  recorder_name: string | null;
  confirm_reason: string | null;
  review_code: ReadingTable['review_code'];
  reviewed_at: Date | null;
  review_note: string | null;
  voided_at: Date | null;
  void_reason: string | null;
  replaces_reading_id: string | null;
};

/** Where a page of readings goes on: after this one. */
export type After = { takenAt: Date; id: string } | null;

/** All readings of a unit, void ones too, the latest first. */
export function listUnitReadings(
  db: Kysely<DB>,
  unitId: string,
  after: After,
  limit: number,
): Promise<ListedReading[]> {
  const page = (condition: RawBuilder<unknown>) => sql`(
    select * from reading where unit_id = ${unitId} and ${condition} and ${isAfter(after)}
     order by taken_at desc, id desc limit ${limit})`;
  return select(
    db,
    sql`${page(sql`voided_at is null`)} union all ${page(sql`voided_at is not null`)}`,
    limit,
  );
}

/** The readings of one unit, or of the units of these docks, that wait for a manager, the latest first. */
export function listReadingsToReview(
  db: Kysely<DB>,
  of: { unitId: string } | { dockIds: 'all' | readonly string[] },
  after: After,
  limit: number,
): Promise<ListedReading[]> {
  const among =
    'unitId' in of
      ? sql`unit_id = ${of.unitId}::uuid`
      : of.dockIds === 'all'
        ? sql`true`
        : sql`unit_id in (select id from unit where dock_id = any(${[...of.dockIds]}::uuid[]))`;
  const waiting = sql`
    select * from reading
     where review_code is not null and reviewed_at is null and voided_at is null and ${among} and ${isAfter(after)}
     order by taken_at desc, id desc limit ${limit}`;
  return select(db, waiting, limit);
}

function isAfter(after: After) {
  return after ? sql`(taken_at, id) < (${after.takenAt}, ${after.id}::uuid)` : sql`true`;
}

async function select(db: Kysely<DB>, chosen: RawBuilder<unknown>, limit: number): Promise<ListedReading[]> {
  const { rows } = await sql<ListedReading>`
    select r.id, r.unit_id, u.fleet_number, u.dock_id, d.name as dock_name, d.time_zone, r.taken_at, r.source,
           r.engine_hours_tenths, r.shown_tenths, before.taken_at as previous_at,
           before.engine_hours_tenths as previous_tenths, r.outing_id, o.started_at as outing_started_at,
           r.recorded_at, p.name as recorder_name, r.confirm_reason, r.review_code, r.reviewed_at, r.review_note,
           r.voided_at, r.void_reason, r.replaces_reading_id
      from (${chosen}) r
      join unit u on u.id = r.unit_id
      join dock d on d.id = u.dock_id
      left join person p on p.id = r.recorded_by
      left join outing o on o.id = r.outing_id
      left join lateral (
        select b.taken_at, b.engine_hours_tenths from reading b
         where b.unit_id = r.unit_id and b.voided_at is null and b.taken_at <= r.taken_at and b.id <> r.id
           and b.engine_hours_tenths <= r.engine_hours_tenths
         order by b.taken_at desc, b.engine_hours_tenths desc limit 1) before on true
     order by r.taken_at desc, r.id desc limit ${limit}`.execute(db);
  return rows;
}
