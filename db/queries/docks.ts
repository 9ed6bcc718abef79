import type { Insertable, Kysely, Selectable, Updateable } from 'kysely';
import type { DB, DockTable } from '../tables';

export type DockRow = Selectable<DockTable>;

/** The docks in order of name; `ids` narrows them. */
export function listDocks(db: Kysely<DB>, ids: 'all' | readonly string[]): Promise<DockRow[]> {
  const query = db.selectFrom('dock').selectAll().orderBy('name');
  return (ids === 'all' ? query : query.where('id', 'in', [...ids])).execute();
}

/** The dock of this id. */
export function findDock(db: Kysely<DB>, id: string): Promise<DockRow | undefined> {
  return db.selectFrom('dock').selectAll().where('id', '=', id).executeTakeFirst();
}

/** Stores a dock and answers it. The index `dock_name` keeps names apart, in any case. */
export function insertDock(db: Kysely<DB>, row: Insertable<DockTable>): Promise<DockRow> {
  return db.insertInto('dock').values(row).returningAll().executeTakeFirstOrThrow();
}

/** Changes a dock; answers it as it is now, undefined when there is none. */
export function updateDock(
  db: Kysely<DB>,
  id: string,
  row: Updateable<DockTable>,
): Promise<DockRow | undefined> {
  return db.updateTable('dock').set(row).where('id', '=', id).returningAll().executeTakeFirst();
}
