import type { Insertable, Kysely, Selectable } from 'kysely';
import type { DB, ModelTable } from '../tables';

export type ModelRow = Selectable<ModelTable>;

export function listModels(db: Kysely<DB>): Promise<ModelRow[]> {
  return db.selectFrom('model').selectAll().orderBy('name').execute();
}

export function findModel(db: Kysely<DB>, id: string): Promise<ModelRow | undefined> {
  return db.selectFrom('model').selectAll().where('id', '=', id).executeTakeFirst();
}

export function insertModel(db: Kysely<DB>, row: Insertable<ModelTable>): Promise<ModelRow> {
  return db.insertInto('model').values(row).returningAll().executeTakeFirstOrThrow();
}
