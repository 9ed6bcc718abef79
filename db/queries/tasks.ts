import type { Kysely } from 'kysely';
import type { DB } from '../tables';

/** A task with what its unit says of it. */
export type TaskRow = NonNullable<Awaited<ReturnType<typeof findTask>>>;

function selectTasks(db: Kysely<DB>) {
  return db
    .selectFrom('task')
    .innerJoin('unit', 'unit.id', 'task.unit_id')
    .innerJoin('dock', 'dock.id', 'unit.dock_id')
    .selectAll('task')
    .select(['unit.fleet_number', 'unit.dock_id', 'dock.name as dock_name', 'dock.time_zone']);
}

export function findTask(db: Kysely<DB>, id: string) {
  return selectTasks(db).where('task.id', '=', id).executeTakeFirst();
}
