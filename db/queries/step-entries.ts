import { sql, type Insertable, type Kysely } from 'kysely';
import type { EntryValue } from '@/lib/domain/procedure';
import type { DB, StepEntryTable } from '../tables';

/** An entry with the name of who made it. */
export type StepEntryRow = Awaited<ReturnType<typeof listStepEntries>>[number];

function selectEntries(db: Kysely<DB>) {
  return db
    .selectFrom('step_entry as e')
    .leftJoin('person as author', 'author.id', 'e.entered_by')
    .selectAll('e')
    .select('author.name as author_name');
}

/** All that was entered on a task, in the order it came in. */
export function listStepEntries(db: Kysely<DB>, taskId: string) {
  return selectEntries(db).where('e.task_id', '=', taskId).orderBy('e.seq').execute();
}

/** The entry of this id, on whatever task. */
export function findStepEntry(db: Kysely<DB>, id: string) {
  return selectEntries(db).where('e.id', '=', id).executeTakeFirst();
}

/** Adds entries in this order. */
export async function insertStepEntries(
  db: Kysely<DB>,
  rows: readonly Insertable<StepEntryTable>[],
): Promise<void> {
  if (rows.length > 0)
    await db
      .insertInto('step_entry')
      .values([...rows])
      .execute();
}

export type MeasuredRow = Awaited<ReturnType<typeof listMeasured>>[number];

/**
 * What was measured on a unit and stands, by engine hours: the latest of each step, place and stage on each task that
 * was not withdrawn.
 */
export async function listMeasured(db: Kysely<DB>, unitId: string) {
  const { rows } = await sql<{
    task_id: string;
    spec: string;
    place: number;
    stage: 'found' | 'left';
    value: EntryValue;
    engine_hours_tenths: number;
    entered_at: Date;
  }>`
    select task_id, spec, place, stage, value, engine_hours_tenths, entered_at from (
      select distinct on (e.task_id, e.step_key, e.place, e.stage) e.*
        from step_entry e
        join task t on t.id = e.task_id and t.withdrawn_by is null and t.withdraw_reason is null
       where e.unit_id = ${unitId} and e.spec is not null and e.stage is not null
       order by e.task_id, e.step_key, e.place, e.stage, e.seq desc
    ) latest
     where value->>'kind' = 'measurement'
     order by engine_hours_tenths, seq`.execute(db);
  return rows;
}
