import type { Insertable, Kysely } from 'kysely';
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
