import { sql, type Kysely, type RawBuilder } from 'kysely';
import type { DB } from '../tables';

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
             select engine_hours_tenths from (
               ${before(sql`p.voided_at is null`)} union all
               ${before(sql`p.voided_at is not null and p.voided_at > r.recorded_at`)}) as b
              order by taken_at desc, engine_hours_tenths desc limit 1), r.engine_hours_tenths) as ran_tenths,
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

/** The reading before `r` among those of a condition; the readings of a meter swap at its own instant are not it. */
function before(condition: RawBuilder<unknown>) {
  return sql`(
    select p.taken_at, p.engine_hours_tenths from reading p
     where p.unit_id = r.unit_id and ${condition} and p.taken_at <= r.taken_at and p.id <> r.id
       and not (p.source in ('swap_final', 'swap_first') and p.taken_at = r.taken_at)
     order by p.taken_at desc, p.engine_hours_tenths desc limit 1)`;
}
