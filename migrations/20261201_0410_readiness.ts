import { sql, type Kysely } from 'kysely';

/**
 * Readiness, derived when it is read. `closing` joins what counts as "done"; `unit_hold(at, on_day)` is the one
 * place that says why a unit may not be hired out, as a view with two parameters: the instant asked about, and
 * optionally a calendar day other than that instant's local day at the unit's dock.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create view closing as
      select c.unit_id, c.rule_id, c.closed_on, c.closed_at, c.engine_hours_tenths, c.outings, c.id
        from closure c where c.reversed_at is null and c.rule_id is not null
      union all
      select b.unit_id, b.rule_id, b.closed_on, b.closed_on::timestamp at time zone 'UTC', b.engine_hours_tenths, b.outings, b.id
        from baseline b where b.withdrawn_at is null;

    create function unit_hold(at timestamptz, on_day date)
    returns table (
      unit_id uuid, dock_id uuid, reason text, rule_id uuid, trigger_index smallint,
      task_id uuid, defect_id uuid, lay_up_id uuid, since timestamptz,
      over_tenths int, over_outings int, over_days int
    )
    language sql stable as $$
      select u.id, u.dock_id, 'overdue', p.rule_id, p.trigger_index, t.id, null::uuid, null::uuid,
             case
               when p.due_tenths is not null then coalesce(
                 (select r.taken_at from reading r
                   where r.unit_id = u.id and r.voided_at is null and r.engine_hours_tenths >= p.overdue_from_tenths
                   order by r.engine_hours_tenths, r.taken_at limit 1), m.read_at)
               when p.due_outings is not null then coalesce(
                 (select o.ended_at from outing o
                   where o.unit_id = u.id and o.voided_at is null and o.ended_at is not null
                   order by o.ended_at
                   offset greatest(p.overdue_from_outings - m.starting_outings - 1, 0) limit 1), m.read_at)
               else p.overdue_from_on::timestamp at time zone d.time_zone
             end,
             case when p.due_tenths is not null then m.engine_hours_tenths - p.overdue_from_tenths end,
             case when p.due_outings is not null then m.outing_count - p.overdue_from_outings end,
             case when p.due_on is not null
               then coalesce(on_day, (at at time zone d.time_zone)::date) - p.overdue_from_on + 1 end
        from unit u
        join dock d on d.id = u.dock_id
        join live_meter m on m.unit_id = u.id
        join due_point p on p.unit_id = u.id
        join rule r on r.id = p.rule_id and r.holds_unit and r.ended_at is null
        left join task t on t.unit_id = u.id and t.rule_id = p.rule_id and t.ended_at is null
       where u.retired_at is null
         and (m.engine_hours_tenths >= p.overdue_from_tenths
           or m.outing_count >= p.overdue_from_outings
           or coalesce(on_day, (at at time zone d.time_zone)::date) >= p.overdue_from_on)
      union all
      select u.id, u.dock_id, 'defect', null, null, t.id, f.id, null, f.reported_at, null, null, null
        from unit u
        join defect f on f.unit_id = u.id and f.cleared_at is null and f.holds_unit
        left join task t on t.defect_id = f.id and t.ended_at is null
       where u.retired_at is null
      union all
      select u.id, u.dock_id, 'laid_up', null, null, null, null, l.id,
             l.from_on::timestamp at time zone d.time_zone, null, null, null
        from unit u
        join dock d on d.id = u.dock_id
        join lay_up l on l.unit_id = u.id and l.ended_at is null
       where u.retired_at is null
         and coalesce(on_day, (at at time zone d.time_zone)::date) >= l.from_on
         and (l.until_on is null or coalesce(on_day, (at at time zone d.time_zone)::date) <= l.until_on)
      union all
      select u.id, u.dock_id, 'not_assessed', null, null, null, null, null, u.created_at, null, null, null
        from unit u
        left join assessment a on a.unit_id = u.id
       where u.retired_at is null
         and (a.unit_id is null or a.assessed_revision < a.wanted_revision)
    $$;

    create function unit_room(at timestamptz, on_day date)
    returns table (
      unit_id uuid, tenths_to_hold int, hours_rule_id uuid, outings_to_hold int, outings_rule_id uuid,
      days_to_hold int, days_rule_id uuid
    )
    language sql stable as $$
      select u.id,
             min(p.overdue_from_tenths - m.engine_hours_tenths),
             (array_agg(p.rule_id order by p.overdue_from_tenths, p.rule_id) filter (where p.overdue_from_tenths is not null))[1],
             min(p.overdue_from_outings - m.outing_count),
             (array_agg(p.rule_id order by p.overdue_from_outings, p.rule_id) filter (where p.overdue_from_outings is not null))[1],
             min(p.overdue_from_on - coalesce(on_day, (at at time zone d.time_zone)::date)),
             (array_agg(p.rule_id order by p.overdue_from_on, p.rule_id) filter (where p.overdue_from_on is not null))[1]
        from unit u
        join dock d on d.id = u.dock_id
        join live_meter m on m.unit_id = u.id
        left join (due_point p join rule r on r.id = p.rule_id and r.holds_unit and r.ended_at is null)
          on p.unit_id = u.id
       where u.retired_at is null
       group by u.id
    $$;
  `.execute(db);
}
