import { sql, type Insertable, type Kysely } from 'kysely';
import type { Labour } from '@/lib/domain/rule';
import type { DB, TaskTable } from '../tables';
import { hasReached, localDayAt } from './due-state';

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
  /** The version of the rule's procedure that stands now. */
  procedure_version_id: string | null;
  carb_count: number;
  engines: number;
};

/**
 * One unit is looked up by its id, as after a check-in. A list stands in a select of its own: PostgreSQL then has no
 * reason to plan a prepared statement for each list.
 */
function among(column: string, unitIds: UnitIds) {
  if (unitIds === 'all') return sql`true`;
  if (unitIds.length === 1) return sql`${sql.ref(column)} = ${unitIds[0]}`;
  return sql`${sql.ref(column)} = any((select ${[...unitIds]}::uuid[])::uuid[])`;
}

/** Units in service with where their meters and days stand; a list of one is looked up, of all is read through. */
const fleet = (unitIds: UnitIds, now: Date) => sql`
    select u.id, m.engine_hours_tenths, m.outing_count, ${localDayAt(now)} as today,
           coalesce(u.carb_count_override, o.carb_count) as carb_count, o.engines
      from unit u
      join model o on o.id = u.model_id
      join dock d on d.id = u.dock_id
      join live_meter m on m.unit_id = u.id
     where u.retired_at is null and ${among('u.id', unitIds)}`;

/**
 * Withdraws the rules' tasks that nobody has begun, planned or written on and that are no longer within their lead;
 * answers the duties that have come within it and have no open task, and the open defects for which no task is open
 * or was ever closed. One statement, for it runs after every check-in.
 */
export async function settleTasks(db: Kysely<DB>, unitIds: UnitIds, now: Date): Promise<WorkToOpen[]> {
  const { rows } = await sql<WorkToOpen>`
    with fleet as materialized (${fleet(unitIds, now)}),
    within_lead as materialized (
      select distinct p.unit_id, p.rule_id
        from fleet f
        join due_point p on p.unit_id = f.id
        join rule r on r.id = p.rule_id and r.ended_at is null
       where ${hasReached('upcoming_from', { meter: 'f', today: sql`f.today` })}),
    withdrawn as (
      update task t set ended_at = ${now}, withdraw_reason = 'No longer due.', revision = t.revision + 1
       where t.ended_at is null and t.origin = 'rule' and t.started_at is null and t.planned_on is null
         and ${among('t.unit_id', unitIds)}
         and not exists (select 1 from task_note n where n.task_id = t.id)
         and not exists (select 1 from within_lead w where w.unit_id = t.unit_id and w.rule_id = t.rule_id))
    select w.unit_id, r.kind, r.name as title, null as detail, w.rule_id, null::uuid as defect_id, r.labour,
           (select v.id from procedure_version v join procedure c on c.id = v.procedure_id and c.retired_at is null
             where v.procedure_id = r.procedure_id order by v.version desc limit 1) as procedure_version_id,
           f.carb_count, f.engines
      from within_lead w
      join fleet f on f.id = w.unit_id
      join rule r on r.id = w.rule_id
     where not exists (select 1 from task t
         where t.unit_id = w.unit_id and t.rule_id = w.rule_id and t.ended_at is null)
    union all
    select d.unit_id, 'repair', d.title, d.detail, null, d.id, null, null, 0, 0
      from defect d
      join fleet f on f.id = d.unit_id
     where d.cleared_at is null and not exists (select 1 from task t where t.defect_id = d.id) /* prepared */`.execute(
    db,
  );
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
