import { sql, type Kysely } from 'kysely';

/**
 * A baseline counts from the start of its day at the unit's dock. From midnight UTC, a baseline of today east of
 * Greenwich stood later than work closed that morning, and one west of it earlier than work of the evening before.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create or replace view closing as
      select c.unit_id, c.rule_id, c.closed_on, c.closed_at, c.engine_hours_tenths, c.outings, c.id
        from closure c where c.reversed_at is null and c.rule_id is not null
      union all
      select b.unit_id, b.rule_id, b.closed_on, b.closed_on::timestamp at time zone d.time_zone,
             b.engine_hours_tenths, b.outings, b.id
        from baseline b join unit u on u.id = b.unit_id join dock d on d.id = u.dock_id
       where b.withdrawn_at is null`.execute(db);
}
