import { sql, type RawBuilder } from 'kysely';

/**
 * The order of a unit's readings `r`, the latest first. Of those of one instant the last is that of the most engine
 * hours; of a meter swap and the reading that came with it, the reading, then the new meter's; of two that are alike
 * in all this, the one recorded last.
 */
export const LATEST_FIRST = sql`r.taken_at desc, r.engine_hours_tenths desc,
  case r.source when 'swap_final' then 2 when 'swap_first' then 1 else 0 end, r.recorded_at desc, r.id desc`;

/** The last reading of the unit at or before an instant, of those that are not void. */
export const lastReadingAt = (unitId: RawBuilder<string>, at: Date): RawBuilder<unknown> => sql`
  select r.* from reading r
   where r.unit_id = ${unitId} and r.voided_at is null and r.taken_at <= ${at}
   order by ${LATEST_FIRST} limit 1`;

/** The first reading of the unit after an instant, of those that are not void: of one instant the least. */
export const firstReadingAfter = (unitId: RawBuilder<string>, at: Date): RawBuilder<unknown> => sql`
  select r.* from reading r
   where r.unit_id = ${unitId} and r.voided_at is null and r.taken_at > ${at}
   order by r.taken_at, r.engine_hours_tenths, r.recorded_at, r.id limit 1`;
