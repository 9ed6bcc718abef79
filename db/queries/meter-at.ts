import { sql, type Kysely, type RawBuilder, type Transaction } from 'kysely';
import type { DB } from '../tables';
import { firstReadingAfter, lastReadingAt } from './reading-order';

/** A reading as its neighbours are compared: what the meter showed, what that made in engine hours, and when. */
export type ReadingThen = {
  shown_tenths: number;
  base_tenths: number;
  engine_hours_tenths: number;
  taken_at: Date;
};

/** The readings on either side of an instant: the last at or before it, the first after it. */
export async function findReadingsAround(
  db: Kysely<DB>,
  unitId: string,
  at: Date,
): Promise<{ last: ReadingThen | null; next: ReadingThen | null }> {
  const unit = sql<string>`${unitId}::uuid`;
  const find = async (reading: RawBuilder<unknown>) => {
    const { rows } = await sql<ReadingThen>`
      select shown_tenths, base_tenths, engine_hours_tenths, taken_at from (${reading}) found`.execute(db);
    return rows[0] ?? null;
  };
  return { last: await find(lastReadingAt(unit, at)), next: await find(firstReadingAfter(unit, at)) };
}

/** How many outings ended after an instant, and when the outing now under way began. */
export async function findOutingsSince(
  db: Kysely<DB>,
  unitId: string,
  at: Date,
): Promise<{ ended: number; outSince: Date | null; out: boolean }> {
  const { rows } = await sql<{ ended: number; outSince: Date | null; out: boolean }>`
    select count(*) filter (where ended_at is not null)::int as ended,
           min(started_at) filter (where ended_at is null) as "outSince",
           coalesce(bool_or(ended_at is null), false) as out
      from outing
     where unit_id = ${unitId} and voided_at is null and (ended_at is null or ended_at > ${at})`.execute(db);
  return rows[0] ?? { ended: 0, outSince: null, out: false };
}

/** Records what the meter showed at a closing, and moves the live meter on to it. */
export async function insertClosureReading(
  trx: Transaction<DB>,
  reading: {
    unit_id: string;
    taken_at: Date;
    shown_tenths: number;
    base_tenths: number;
    recorded_at: Date;
    recorded_by: string | null;
    review_code: 'unusual_jump' | null;
    confirm_reason: string | null;
  },
): Promise<void> {
  const { id } = await trx
    .insertInto('reading')
    .values({ ...reading, source: 'closure' })
    .returning('id')
    .executeTakeFirstOrThrow();
  await trx
    .updateTable('live_meter')
    .set({
      reading_id: id,
      read_at: reading.taken_at,
      shown_tenths: reading.shown_tenths,
      engine_hours_tenths: reading.shown_tenths + reading.base_tenths,
    })
    .where('unit_id', '=', reading.unit_id)
    .execute();
}
