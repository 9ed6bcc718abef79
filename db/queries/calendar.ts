import { sql, type Kysely } from 'kysely';
import type { CalendarDay } from '@/lib/domain/calendar-day';
import type { DuePointColumns } from '@/lib/domain/duty-standing';
import type { Window } from '@/lib/domain/rule';
import type { DB, TaskTable } from '../tables';
import { hasReached, localDayAt } from './due-state';

type Range = { dockIds: 'all' | readonly string[]; from: CalendarDay; to: CalendarDay };

/** An open task, or a duty without one, with all that places it on the calendar. */
export type OpenWorkRow = {
  task_id: string | null;
  unit_id: string;
  rule_id: string | null;
  kind: TaskTable['kind'];
  title: string;
  planned_on: CalendarDay | null;
  revision: number | null;
  started: boolean;
  fleet_number: string;
  dock_id: string;
  time_zone: string;
  engine_hours_tenths: number;
  outing_count: number;
  tolerance: Window | null;
  rule_holds: boolean | null;
  defect_holds: boolean | null;
  points: DuePointColumns[];
};

const atDocks = (dockIds: Range['dockIds']) =>
  dockIds === 'all' ? sql`true` : sql`u.dock_id = any(${[...dockIds]}::uuid[])`;

/** What stands for a unit's duty without a task while another selects it: no open task of the rule. */
const withoutTask = sql`not exists (select 1 from task t
  where t.unit_id = p.unit_id and t.rule_id = p.rule_id and t.ended_at is null)`;

/**
 * Every open task; every duty without one that is due by now or by the calendar within the range; and the `nearest`
 * duties that go by meters alone and are not due yet, hours and outings set against each other at a pace a day.
 */
export async function listOpenWork(
  db: Kysely<DB>,
  { dockIds, from, to }: Range,
  options: { now: Date; nearest: number; pace: { tenthsPerDay: number; outingsPerDay: number } },
): Promise<OpenWorkRow[]> {
  const { now, nearest, pace } = options;
  const due = hasReached('due', { meter: 'm', today: localDayAt(now) });
  const { rows } = await sql<OpenWorkRow>`
    with work as (
      select t.id as task_id, t.unit_id, t.rule_id
        from task t join unit u on u.id = t.unit_id
       where t.ended_at is null and u.retired_at is null and ${atDocks(dockIds)}
      union all
      select null, p.unit_id, p.rule_id
        from due_point p
        join unit u on u.id = p.unit_id and u.retired_at is null
        join dock d on d.id = u.dock_id
        join live_meter m on m.unit_id = u.id
       where ${atDocks(dockIds)} and (p.due_on between ${from}::date and ${to}::date or ${due}) and ${withoutTask}
       group by p.unit_id, p.rule_id
      union all
      (select null, p.unit_id, p.rule_id
        from due_point p
        join unit u on u.id = p.unit_id and u.retired_at is null
        join dock d on d.id = u.dock_id
        join live_meter m on m.unit_id = u.id
       where ${atDocks(dockIds)} and ${withoutTask}
       group by p.unit_id, p.rule_id
      having bool_and(p.due_on is null) and not bool_or(${due} is true)
       order by min(coalesce((p.due_tenths - m.engine_hours_tenths) / ${pace.tenthsPerDay}::float8,
                             (p.due_outings - m.outing_count) / ${pace.outingsPerDay}::float8)), 2, 3
       limit ${nearest})
    )
    select w.task_id, w.unit_id, w.rule_id, coalesce(t.kind, r.kind) as kind, coalesce(t.title, r.name) as title,
           t.planned_on, t.revision, t.started_at is not null as started,
           u.fleet_number, u.dock_id, d.time_zone, m.engine_hours_tenths, m.outing_count,
           r.tolerance, r.holds_unit as rule_holds, f.holds_unit as defect_holds,
           coalesce((select json_agg(p order by p.trigger_index) from due_point p
             where p.unit_id = w.unit_id and p.rule_id = w.rule_id), '[]') as points
      from work w
      join unit u on u.id = w.unit_id
      join dock d on d.id = u.dock_id
      join live_meter m on m.unit_id = u.id
      left join task t on t.id = w.task_id
      left join rule r on r.id = w.rule_id and r.ended_at is null
      left join defect f on f.id = t.defect_id and f.cleared_at is null
     where w.task_id is not null or r.id is not null`.execute(db);
  return rows;
}

/** A task that was closed, on the day it was. */
export type ClosedWorkRow = {
  closure_id: string;
  task_id: string;
  unit_id: string;
  rule_id: string | null;
  kind: TaskTable['kind'];
  title: string;
  closed_on: CalendarDay;
  planned_on: CalendarDay | null;
  fleet_number: string;
  dock_id: string;
};

/** The closures of these days that are not reversed. */
export async function listClosedWork(db: Kysely<DB>, { dockIds, from, to }: Range): Promise<ClosedWorkRow[]> {
  const { rows } = await sql<ClosedWorkRow>`
    select c.id as closure_id, c.task_id, c.unit_id, c.rule_id, t.kind, t.title, c.closed_on, t.planned_on,
           u.fleet_number, u.dock_id
      from closure c
      join task t on t.id = c.task_id
      join unit u on u.id = c.unit_id
     where c.reversed_at is null and ${atDocks(dockIds)}
       and c.closed_on between ${from}::date and ${to}::date
       and c.closed_at >= ${from}::date - interval '1 day' and c.closed_at < ${to}::date + interval '2 days'`.execute(
    db,
  );
  return rows;
}

/** The instant up to which every fact recorded has been turned into due points and tasks; `now` when none waits. */
export async function getFreshAsOf(db: Kysely<DB>, now: Date): Promise<Date> {
  const { rows } = await sql<{ fresh: Date }>`
    select least(min(created_at), ${now}::timestamptz) as fresh from graphile_worker.jobs
     where task_identifier in ('refresh-due', 'refresh-rule', 'open-tasks')`.execute(db);
  return rows[0]?.fresh ?? now;
}
