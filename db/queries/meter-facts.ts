import { sql, type Kysely } from 'kysely';
import type { DB } from '../tables';
import { firstReadingAfter, lastReadingAt } from './reading-order';

/** Which unit, as of when, and the id under which the reading is to be kept. */
export type MeterFactsAsked = { unitId: string; at: Date; readingId: string };

/** Everything a new reading of a unit is held against. Columns of what is not there are null. */
export type MeterFacts = {
  unit_id: string;
  dock_id: string;
  fleet_number: string;
  retired_at: Date | null;
  time_zone: string;
  revision: number;
  reading_id: string | null;
  read_at: Date;
  base_tenths: number;
  shown_tenths: number;
  outing_count: number;
  last_at: Date | null;
  last_shown_tenths: number | null;
  last_base_tenths: number | null;
  next_at: Date | null;
  next_engine_hours_tenths: number | null;
  open_outing_id: string | null;
  open_started_at: Date | null;
  kept_unit_id: string | null;
  kept_source: string | null;
};

/**
 * The unit with its live meter, the readings before and after the instant asked about, its open outing, and the
 * reading kept under this id, in one round trip and without a lock: `revision` says later whether it still holds.
 */
export async function findMeterFacts(
  db: Kysely<DB>,
  { unitId, at, readingId }: MeterFactsAsked,
): Promise<MeterFacts | undefined> {
  const { rows } = await sql<MeterFacts>`
    select u.id as unit_id, u.dock_id, u.fleet_number, u.retired_at, d.time_zone,
           m.revision, m.reading_id, m.read_at, m.base_tenths, m.shown_tenths, m.outing_count,
           last.taken_at as last_at, last.shown_tenths as last_shown_tenths, last.base_tenths as last_base_tenths,
           next.taken_at as next_at, next.engine_hours_tenths as next_engine_hours_tenths,
           o.id as open_outing_id, o.started_at as open_started_at,
           kept.unit_id as kept_unit_id, kept.source as kept_source
      from unit u
      join dock d on d.id = u.dock_id
      join live_meter m on m.unit_id = u.id
      left join lateral (${lastReadingAt(sql`u.id`, at)}) last on true
      left join lateral (${firstReadingAfter(sql`u.id`, at)}) next on true
      left join outing o on o.unit_id = u.id and o.ended_at is null and o.voided_at is null
      left join reading kept on kept.id = ${readingId}
     where u.id = ${unitId} /* prepared */`.execute(db);
  return rows[0];
}
