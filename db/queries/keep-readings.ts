import { sql, type Kysely, type RawBuilder } from 'kysely';
import type { DB, ReadingTable } from '../tables';

/** Where the live meter stands once a reading is kept. */
export type KeptMeter = {
  reading_id: string | null;
  read_at: Date;
  base_tenths: number;
  shown_tenths: number;
  outing_count: number;
};

export type NewReading = {
  id: string;
  taken_at: Date;
  shown_tenths: number;
  base_tenths: number;
  source: ReadingTable['source'];
  confirm_reason: string | null;
  review_code: ReadingTable['review_code'];
};

/** What one entry at the dock writes. `outing` is the one it ends: one that is open, or one whose start is unknown. */
export type ReadingsToKeep = {
  unitId: string;
  dockId: string;
  /** The live meter's revision that the entry was judged by. */
  revision: number;
  meter: KeptMeter;
  readings: NewReading[];
  outing: { id: string; open: boolean; endedAt: Date } | null;
  defect: {
    id: string;
    title: string;
    detail: string | null;
    holds_unit: boolean;
    reading_id: string;
  } | null;
  recordedAt: Date;
  recordedBy: string | null;
  /** The expression that puts the job on the queue. */
  job: RawBuilder<unknown>;
};

/**
 * Keeps the readings, the end of the outing, the defect and the job in one statement, which is its own transaction:
 * all of it, or nothing when the unit's facts have changed since `revision`. Answers whether it was kept.
 */
export async function keepReadings(db: Kysely<DB>, kept: ReadingsToKeep): Promise<boolean> {
  const { meter, outing, defect } = kept;
  const { rows } = await sql`
    with moved as (
      update live_meter set
        revision = revision + 1, reading_id = ${meter.reading_id}, read_at = ${meter.read_at},
        base_tenths = ${meter.base_tenths}, shown_tenths = ${meter.shown_tenths},
        engine_hours_tenths = ${meter.base_tenths + meter.shown_tenths}, outing_count = ${meter.outing_count}
       where unit_id = ${kept.unitId} and revision = ${kept.revision}
      returning unit_id
    ), outing_ended as (${outing ? endOuting(kept, outing) : sql`select 1`}
    ), readings_kept as (
      insert into reading (id, unit_id, taken_at, shown_tenths, base_tenths, source, confirm_reason, review_code,
        outing_id, recorded_at, recorded_by)
      select r.id, moved.unit_id, r.taken_at, r.shown_tenths, r.base_tenths, r.source, r.confirm_reason, r.review_code,
             ${outing?.id ?? null}::uuid, ${kept.recordedAt}::timestamptz, ${kept.recordedBy}::uuid
        from moved, json_to_recordset(${JSON.stringify(kept.readings)}::json) as r(
          id uuid, taken_at timestamptz, shown_tenths int, base_tenths int, source text, confirm_reason text,
          review_code text)
    ), defect_kept as (${
      defect
        ? sql`
      insert into defect (id, unit_id, title, detail, holds_unit, reported_at, reported_by, reading_id)
      select ${defect.id}::uuid, unit_id, ${defect.title}, ${defect.detail}, ${defect.holds_unit}::boolean,
             ${kept.recordedAt}::timestamptz, ${kept.recordedBy}::uuid, ${defect.reading_id}::uuid
        from moved`
        : sql`select 1`
    })
    select ${kept.job} from moved /* prepared */`.execute(db);
  return rows.length === 1;
}

function endOuting(kept: ReadingsToKeep, { id, open, endedAt }: NonNullable<ReadingsToKeep['outing']>) {
  return open
    ? sql`
      update outing set ended_at = ${endedAt}, checked_in_by = ${kept.recordedBy}, ended_dock_id = ${kept.dockId}
        from moved where outing.id = ${id}`
    : sql`
      insert into outing (id, unit_id, dock_id, ended_at, checked_in_by, ended_dock_id)
      select ${id}::uuid, unit_id, ${kept.dockId}::uuid, ${endedAt}::timestamptz, ${kept.recordedBy}::uuid,
             ${kept.dockId}::uuid
        from moved`;
}
