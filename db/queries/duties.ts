import { sql, type Insertable, type Kysely } from 'kysely';
import type { Labour } from '@/lib/domain/rule';
import type { DB, TaskTable } from '../tables';

type UnitIds = readonly string[] | 'all';

/** A rule that has come within its lead on a unit, or an open defect, for which a task is to be opened. */
export type WorkToOpen = {
  unit_id: string;
  kind: TaskTable['kind'];
  title: string;
  detail: string | null;
  rule_id: string | null;
  defect_id: string | null;
  /** What the work takes; null for a defect. */
  labour: Labour | null;
  carb_count: number;
  engines: number;
};

/** The list stands in a select of its own: PostgreSQL then has no reason to plan a prepared statement for each list. */
const among = (column: string, unitIds: UnitIds) =>
  unitIds === 'all' ? sql`true` : sql`${sql.ref(column)} = any((select ${[...unitIds]}::uuid[])::uuid[])`;

/** Whether a due point `p` is upcoming or worse, by live meter `m` and the local day at dock `d`. */
const withinLead = (now: Date) => sql`(m.engine_hours_tenths >= p.upcoming_from_tenths
  or m.outing_count >= p.upcoming_from_outings
  or (${now}::timestamptz at time zone d.time_zone)::date >= p.upcoming_from_on)`;

/**
 * Withdraws the rules' tasks that nobody has begun, planned or written on and that are no longer within their lead;
 * answers the duties that have come within it and have no open task, and the open defects for which no task is open
 * or was ever closed. One statement, for it runs after every check-in.
 */
export async function settleTasks(db: Kysely<DB>, unitIds: UnitIds, now: Date): Promise<WorkToOpen[]> {
  const { rows } = await sql<WorkToOpen>`
    with withdrawn as (${withdrawNoLongerDue(unitIds, now)})
    select distinct p.unit_id, r.kind, r.name as title, null as detail, p.rule_id, null::uuid as defect_id, r.labour,
           coalesce(u.carb_count_override, o.carb_count) as carb_count, o.engines
      from due_point p
      join unit u on u.id = p.unit_id and u.retired_at is null
      join model o on o.id = u.model_id
      join dock d on d.id = u.dock_id
      join live_meter m on m.unit_id = u.id
      join rule r on r.id = p.rule_id and r.ended_at is null
     where ${among('p.unit_id', unitIds)} and ${withinLead(now)}
       and not exists (select 1 from task t
         where t.unit_id = p.unit_id and t.rule_id = p.rule_id and t.ended_at is null)
    union all
    select f.unit_id, 'repair', f.title, f.detail, null, f.id, null, 0, 0
      from defect f
      join unit u on u.id = f.unit_id and u.retired_at is null
     where f.cleared_at is null and ${among('f.unit_id', unitIds)}
       and not exists (select 1 from task t where t.defect_id = f.id) /* prepared */`.execute(db);
  return rows;
}

/** Inserts tasks; one that is open already for the same rule or defect of a unit stays as it is. */
export async function insertTasks(db: Kysely<DB>, rows: Insertable<TaskTable>[]): Promise<void> {
  if (rows.length > 0)
    await db
      .insertInto('task')
      .values(rows)
      .onConflict((oc) => oc.doNothing())
      .execute();
}

const withdrawNoLongerDue = (unitIds: UnitIds, now: Date) => sql`
    update task t set ended_at = ${now}, withdraw_reason = 'No longer due.', revision = t.revision + 1
     where t.ended_at is null and t.origin = 'rule' and t.started_at is null and t.planned_on is null
       and ${among('t.unit_id', unitIds)}
       and not exists (select 1 from task_note n where n.task_id = t.id)
       and not exists (
         select 1 from due_point p
           join unit u on u.id = p.unit_id
           join dock d on d.id = u.dock_id
           join live_meter m on m.unit_id = u.id
           join rule r on r.id = p.rule_id and r.ended_at is null
          where p.unit_id = t.unit_id and p.rule_id = t.rule_id and ${withinLead(now)})`;
