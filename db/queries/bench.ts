import { sql, type Insertable, type Kysely, type Transaction } from 'kysely';
import type { DB, SignOffTable } from '../tables';

/** What the work of a task is judged by: its procedure, its unit's counts and specs, what it asks for. */
export type BenchRow = NonNullable<Awaited<ReturnType<typeof findBench>>>;

/** A task as its bench needs it; `steps` is null for a task without a procedure. */
export function findBench(db: Kysely<DB>, taskId: string) {
  return db
    .selectFrom('task as t')
    .innerJoin('unit as u', 'u.id', 't.unit_id')
    .innerJoin('model as m', 'm.id', 'u.model_id')
    .innerJoin('live_meter as meter', 'meter.unit_id', 'u.id')
    .leftJoin('procedure_version as v', 'v.id', 't.procedure_version_id')
    .leftJoin('rule as r', 'r.id', 't.rule_id')
    .leftJoin('defect as f', 'f.id', 't.defect_id')
    .where('t.id', '=', taskId)
    .select([
      't.id as task_id',
      't.unit_id',
      't.only_per',
      't.only_place',
      't.ended_at',
      'v.steps',
      'm.engines',
      'm.cylinders',
      'm.specs as model_specs',
      'u.specs as unit_specs',
      'meter.engine_hours_tenths',
      sql<number>`coalesce(u.carb_count_override, m.carb_count)`.as('carb_count'),
      sql<boolean>`coalesce(r.holds_unit, false) or coalesce(f.holds_unit, false)`.as('holds_unit'),
      sql<boolean>`t.wants_second_person or coalesce(r.wants_second_person, false)`.as('wants_second_person'),
      sql<boolean>`t.wants_test_ride or coalesce(r.wants_test_ride, false)`.as('wants_test_ride'),
    ])
    .executeTakeFirst();
}

export type FollowUpRow = Awaited<ReturnType<typeof listFollowUps>>[number];

/** What failed steps of a task opened: a defect, a task, or a defect with its task. */
export async function listFollowUps(db: Kysely<DB>, taskId: string) {
  const { rows } = await sql<{
    step_key: string;
    place: number;
    title: string;
    defect_id: string | null;
    defect_holds: boolean;
    defect_open: boolean;
    task_id: string | null;
    task_open: boolean;
    task_closed: boolean;
  }>`
    select e.step_key, e.place, coalesce(t.title, f.title) as title,
           f.id as defect_id, coalesce(f.holds_unit, false) as defect_holds,
           f.id is not null and f.cleared_at is null as defect_open,
           t.id as task_id, t.id is not null and t.ended_at is null as task_open,
           exists (select 1 from closure c where c.task_id = t.id and c.reversed_at is null) as task_closed
      from step_entry e
      left join defect f on f.step_entry_id = e.id
      left join task t on t.step_entry_id = e.id or t.defect_id = f.id
     where e.task_id = ${taskId} and (f.id is not null or t.id is not null)
     order by e.seq, coalesce(t.opened_at, f.reported_at), t.id`.execute(db);
  return rows;
}

/** Notes that a person is at a task now. */
export async function seePerson(
  db: Kysely<DB>,
  seen: { task_id: string; person_id: string; seen_at: Date },
): Promise<void> {
  await db
    .insertInto('task_presence')
    .values(seen)
    .onConflict((conflict) =>
      conflict
        .columns(['task_id', 'person_id'])
        .doUpdateSet({ seen_at: sql`greatest(excluded.seen_at, task_presence.seen_at)` }),
    )
    .execute();
}

/** Who was seen at a task since then, by name. */
export function listPresent(db: Kysely<DB>, taskId: string, since: Date) {
  return db
    .selectFrom('task_presence as s')
    .innerJoin('person as p', 'p.id', 's.person_id')
    .where('s.task_id', '=', taskId)
    .where('s.seen_at', '>', since)
    .where('p.deactivated_at', 'is', null)
    .select(['p.id', 'p.name', 's.seen_at'])
    .orderBy('p.name')
    .execute();
}

/** The signatures on a task that were not withdrawn. */
export function listSignOffs(db: Kysely<DB>, taskId: string) {
  return db
    .selectFrom('sign_off as s')
    .innerJoin('person as p', 'p.id', 's.signed_by')
    .where('s.task_id', '=', taskId)
    .where('s.withdrawn_at', 'is', null)
    .selectAll('s')
    .select('p.name as signer_name')
    .orderBy('s.signed_at')
    .execute();
}

/** The signature of this id, withdrawn or not. */
export function findSignOff(db: Kysely<DB>, id: string) {
  return db.selectFrom('sign_off').selectAll().where('id', '=', id).executeTakeFirst();
}

/** Stores a signature. The index `sign_off_standing` keeps one of a kind a task. */
export async function insertSignOff(trx: Transaction<DB>, row: Insertable<SignOffTable>): Promise<void> {
  await trx.insertInto('sign_off').values(row).execute();
}

/** Withdraws the standing signatures of a kind on a task. */
export async function withdrawSignOffs(
  trx: Transaction<DB>,
  { taskId, kind, at, by }: { taskId: string; kind: SignOffTable['kind']; at: Date; by: string | null },
): Promise<void> {
  await trx
    .updateTable('sign_off')
    .set({ withdrawn_at: at, withdrawn_by: by })
    .where('task_id', '=', taskId)
    .where('kind', '=', kind)
    .where('withdrawn_at', 'is', null)
    .execute();
}
