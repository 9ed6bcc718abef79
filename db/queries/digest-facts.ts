import { sql, type Kysely } from 'kysely';
import type { CalendarDay } from '@/lib/domain/calendar-day';
import type { DuePointColumns } from '@/lib/domain/duty-standing';
import type { DB } from '../tables';
import { localDayAt } from './due-state';
import { lastReadingAt } from './reading-order';

type At = { dock_id: string; unit_id: string; fleet_number: string };
type Docks = readonly string[];

export type StoredDuty = At & {
  rule_id: string;
  rule_name: string;
  holds_unit: boolean;
  engine_hours_tenths: number;
  outing_count: number;
  ran_tenths: number;
  ran_outings: number;
  points: DuePointColumns[];
};

/**
 * Duties at these docks that are past their due point, or within seven days or 28 days' running of it, with what
 * the unit ran in the 28 days before `now`.
 */
export async function listNearDuties(db: Kysely<DB>, dockIds: Docks, now: Date): Promise<StoredDuty[]> {
  const since = new Date(now.getTime() - 28 * 86_400_000);
  const { rows } = await sql<StoredDuty>`
    with fleet as (
      select u.id, u.dock_id, u.fleet_number, m.engine_hours_tenths, m.outing_count,
             ${localDayAt(now)} as today,
             m.engine_hours_tenths - coalesce(
               (select r.engine_hours_tenths from (${lastReadingAt(sql`u.id`, since)}) r),
               (select r.engine_hours_tenths from reading r
                 where r.unit_id = u.id and r.voided_at is null
                 order by r.taken_at, r.engine_hours_tenths limit 1),
               m.engine_hours_tenths) as ran_tenths,
             (select count(*)::int from outing o
               where o.unit_id = u.id and o.voided_at is null
                 and o.ended_at > ${since}) as ran_outings
        from unit u
        join dock d on d.id = u.dock_id
        join live_meter m on m.unit_id = u.id
       where u.retired_at is null and u.dock_id = any(${[...dockIds]}::uuid[])
    )
    select f.dock_id, f.id as unit_id, f.fleet_number, f.engine_hours_tenths, f.outing_count, f.ran_tenths,
           f.ran_outings, r.id as rule_id, r.name as rule_name, r.holds_unit,
           json_agg(to_json(p) order by p.trigger_index) as points
      from fleet f
      join due_point p on p.unit_id = f.id
      join rule r on r.id = p.rule_id and r.ended_at is null
     group by f.dock_id, f.id, f.fleet_number, f.engine_hours_tenths, f.outing_count, f.ran_tenths, f.ran_outings, r.id
    having bool_or(p.due_tenths <= f.engine_hours_tenths + f.ran_tenths
        or p.due_outings <= f.outing_count + f.ran_outings
        or p.due_on <= f.today + 7)`.execute(db);
  return rows;
}

export type StoredHeldTime = At & { entered_service_on: CalendarDay; from_at: Date; until_at: Date | null };

/**
 * When units at these docks were held since `after`: holds that stand now, tasks and defects that ended one, and
 * lay-ups. They may overlap. A unit that only waits for the worker's assessment is not counted as held.
 */
export async function listHeldTimes(
  db: Kysely<DB>,
  dockIds: Docks,
  { now, after }: { now: Date; after: Date },
): Promise<StoredHeldTime[]> {
  const { rows } = await sql<StoredHeldTime>`
    with held as (
      select unit_id, since as from_at, null::timestamptz as until_at
        from unit_hold(${now}::timestamptz, null) where reason <> 'not_assessed' and since is not null
      union all
      select unit_id, held_since_at, closed_at from closure
       where reversed_at is null and held_since_at is not null and closed_at > ${after}
      union all
      select unit_id, reported_at, cleared_at from defect where holds_unit and cleared_at > ${after}
      union all
      select l.unit_id, l.from_on::timestamp at time zone d.time_zone,
             least(l.ended_at, (l.until_on + 1)::timestamp at time zone d.time_zone)
        from lay_up l join unit u on u.id = l.unit_id join dock d on d.id = u.dock_id
       where least(l.ended_at, (l.until_on + 1)::timestamp at time zone d.time_zone) > ${after}
    )
    select u.dock_id, u.id as unit_id, u.fleet_number, u.entered_service_on, h.from_at, h.until_at
      from held h
      join unit u on u.id = h.unit_id
     where u.retired_at is null and u.dock_id = any(${[...dockIds]}::uuid[])`.execute(db);
  return rows;
}

export type StoredClosed = At & {
  task_id: string;
  title: string;
  closed_on: CalendarDay;
  engine_hours_tenths: number;
  closed_by: string | null;
};

/** Tasks of units at these docks that were closed from one day to another, both included. */
export async function listClosed(
  db: Kysely<DB>,
  dockIds: Docks,
  { from, to }: { from: CalendarDay; to: CalendarDay },
): Promise<StoredClosed[]> {
  const { rows } = await sql<StoredClosed>`
    select u.dock_id, u.id as unit_id, u.fleet_number, t.id as task_id, t.title, c.closed_on,
           c.engine_hours_tenths, w.name as closed_by
      from closure c
      join task t on t.id = c.task_id
      join unit u on u.id = c.unit_id
      left join person w on w.id = c.closed_by
     where c.reversed_at is null and c.closed_on between ${from} and ${to}
       and c.closed_at > ${from}::date - interval '2 days'
       and u.dock_id = any(${[...dockIds]}::uuid[])`.execute(db);
  return rows;
}
