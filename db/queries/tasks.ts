import {
  sql,
  type Insertable,
  type Kysely,
  type Selectable,
  type Transaction,
  type Updateable,
} from 'kysely';
import type { DuePointColumns } from '@/lib/domain/duty-standing';
import type { DB, TaskTable } from '../tables';

/** A task with what its unit says of it. */
export type TaskRow = NonNullable<Awaited<ReturnType<typeof findTask>>>;
/** A task with all that a list shows of it. */
export type TaskStandingRow = Awaited<ReturnType<typeof listOpenTasks>>[number];

function selectTasks(db: Kysely<DB>) {
  return db
    .selectFrom('task')
    .innerJoin('unit', 'unit.id', 'task.unit_id')
    .innerJoin('dock', 'dock.id', 'unit.dock_id')
    .selectAll('task')
    .select(['unit.fleet_number', 'unit.dock_id', 'dock.name as dock_name', 'dock.time_zone']);
}

/** Tasks with the live meter, the due points of their rule, whom they name and how they were closed. */
function selectTaskStandings(db: Kysely<DB>) {
  return selectTasks(db)
    .innerJoin('model', 'model.id', 'unit.model_id')
    .innerJoin('live_meter as meter', 'meter.unit_id', 'task.unit_id')
    .leftJoin('rule', 'rule.id', 'task.rule_id')
    .leftJoin('defect', 'defect.id', 'task.defect_id')
    .leftJoin('person as starter', 'starter.id', 'task.started_by')
    .leftJoin('closure', (join) =>
      join.onRef('closure.task_id', '=', 'task.id').on('closure.reversed_at', 'is', null),
    )
    .leftJoin('person as closer', 'closer.id', 'closure.closed_by')
    .select((eb) => [
      'model.name as model_name',
      'meter.engine_hours_tenths as meter_tenths',
      'meter.outing_count as meter_outings',
      'meter.read_at as meter_read_at',
      'rule.holds_unit as rule_holds',
      'rule.ended_at as rule_ended_at',
      'defect.holds_unit as defect_holds',
      'defect.cleared_at as defect_cleared_at',
      'starter.name as starter_name',
      'closure.id as closure_id',
      'closure.closed_at',
      'closure.closed_on',
      'closure.engine_hours_tenths as closed_tenths',
      'closure.closed_by',
      'closer.name as closer_name',
      eb
        .selectFrom('due_point as p')
        .whereRef('p.unit_id', '=', 'task.unit_id')
        .whereRef('p.rule_id', '=', 'task.rule_id')
        .select(sql<DuePointColumns[]>`coalesce(json_agg(p order by p.trigger_index), '[]')`.as('list'))
        .as('points'),
    ]);
}

/** The task of this id, open or ended. */
export function findTask(db: Kysely<DB>, id: string) {
  return selectTasks(db).where('task.id', '=', id).executeTakeFirst();
}

/** The task of this id with all that a list shows of it. Throws when there is none. */
export function getTaskStanding(db: Kysely<DB>, id: string) {
  return selectTaskStandings(db).where('task.id', '=', id).executeTakeFirstOrThrow();
}

/** What narrows a list of tasks. */
export type TaskFilter = {
  dockIds: 'all' | readonly string[];
  unitId?: string;
  kind?: TaskRow['kind'];
  startedBy?: string;
};

function selectFiltered(db: Kysely<DB>, { dockIds, unitId, kind, startedBy }: TaskFilter) {
  let query = selectTaskStandings(db);
  if (dockIds !== 'all') query = query.where('unit.dock_id', '=', sql<string>`any(${[...dockIds]}::uuid[])`);
  if (unitId) query = query.where('task.unit_id', '=', unitId);
  if (kind) query = query.where('task.kind', '=', kind);
  if (startedBy) query = query.where('task.started_by', '=', startedBy);
  return query;
}

/** The open tasks of units in service, in no order: how urgent each is, the domain decides. */
export function listOpenTasks(db: Kysely<DB>, filter: TaskFilter) {
  return selectFiltered(db, filter)
    .where('task.ended_at', 'is', null)
    .where('unit.retired_at', 'is', null)
    .execute();
}

/** The place in a list ordered by an instant after which the next page begins. */
export type TaskPlace = { at: Date; id: string };

/** Tasks that ended, the latest first. */
export function listEndedTasks(db: Kysely<DB>, filter: TaskFilter, after: TaskPlace | null, limit: number) {
  let query = selectFiltered(db, filter).where('task.ended_at', 'is not', null);
  if (after)
    query = query.where(
      sql<boolean>`(task.ended_at, task.id) < (${after.at}::timestamptz, ${after.id}::uuid)`,
    );
  return query.orderBy('task.ended_at', 'desc').orderBy('task.id', 'desc').limit(limit).execute();
}

/** Tasks open and ended, the one opened last first. */
export function listAllTasks(db: Kysely<DB>, filter: TaskFilter, after: TaskPlace | null, limit: number) {
  let query = selectFiltered(db, filter);
  if (after)
    query = query.where(
      sql<boolean>`(task.opened_at, task.id) < (${after.at}::timestamptz, ${after.id}::uuid)`,
    );
  return query.orderBy('task.opened_at', 'desc').orderBy('task.id', 'desc').limit(limit).execute();
}

/** Locks a task against every other writer of it. Answers its row as it now is. */
export function lockTask(trx: Transaction<DB>, id: string): Promise<Selectable<TaskTable>> {
  return trx.selectFrom('task').selectAll().where('id', '=', id).forUpdate().executeTakeFirstOrThrow();
}

/** Another open task of the same rule on the same unit, locked. */
export function lockOtherOpenTask(
  trx: Transaction<DB>,
  task: { id: string; unit_id: string; rule_id: string },
) {
  return trx
    .selectFrom('task')
    .selectAll('task')
    .select((eb) => [
      eb
        .exists(
          eb.selectFrom('task_note').whereRef('task_note.task_id', '=', 'task.id').select('task_note.id'),
        )
        .as('has_notes'),
    ])
    .where('unit_id', '=', task.unit_id)
    .where('rule_id', '=', task.rule_id)
    .where('ended_at', 'is', null)
    .where('id', '!=', task.id)
    .forUpdate()
    .executeTakeFirst();
}

/** Stores an open task; answers its id. Indexes keep one open task a rule on a unit, and one a defect. */
export function insertTask(db: Kysely<DB>, row: Insertable<TaskTable>): Promise<{ id: string }> {
  return db.insertInto('task').values(row).returning('id').executeTakeFirstOrThrow();
}

/** Changes a task and counts its revision up. */
export async function updateTask(
  trx: Transaction<DB>,
  id: string,
  set: Updateable<TaskTable>,
): Promise<void> {
  await trx
    .updateTable('task')
    .set((eb) => ({ ...set, revision: eb('revision', '+', 1) }))
    .where('id', '=', id)
    .execute();
}

export type TaskNoteRow = Awaited<ReturnType<typeof listTaskNotes>>[number];

/** The notes on a task in the order they were written. */
export function listTaskNotes(db: Kysely<DB>, taskId: string) {
  return db
    .selectFrom('task_note')
    .leftJoin('person', 'person.id', 'task_note.written_by')
    .selectAll('task_note')
    .select('person.name as writer_name')
    .where('task_id', '=', taskId)
    .orderBy('written_at')
    .orderBy('task_note.id')
    .execute();
}

/** Stores a note on a task; answers its id. */
export function insertTaskNote(
  db: Kysely<DB>,
  row: { task_id: string; text: string; written_at: Date; written_by: string | null },
): Promise<{ id: string }> {
  return db.insertInto('task_note').values(row).returning('id').executeTakeFirstOrThrow();
}
