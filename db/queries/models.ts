import type { Insertable, Kysely, Selectable, Transaction, Updateable } from 'kysely';
import type { DB, ModelTable } from '../tables';

export type ModelRow = Selectable<ModelTable>;

/** All models, by name. */
export function listModels(db: Kysely<DB>): Promise<ModelRow[]> {
  return db.selectFrom('model').selectAll().orderBy('name').execute();
}

/** The model of this id. */
export function findModel(db: Kysely<DB>, id: string): Promise<ModelRow | undefined> {
  return db.selectFrom('model').selectAll().where('id', '=', id).executeTakeFirst();
}

/** Stores a model and answers it. The index `model_name` keeps names apart, in any case. */
export function insertModel(db: Kysely<DB>, row: Insertable<ModelTable>): Promise<ModelRow> {
  return db.insertInto('model').values(row).returningAll().executeTakeFirstOrThrow();
}

/** The model, locked against others who change it. */
export function lockModel(trx: Transaction<DB>, id: string): Promise<ModelRow | undefined> {
  return trx.selectFrom('model').selectAll().where('id', '=', id).forUpdate().executeTakeFirst();
}

/** Changes a model; answers it as it is now. `row` names at least one column. */
export function updateModel(
  trx: Transaction<DB>,
  id: string,
  row: Updateable<ModelTable>,
): Promise<ModelRow> {
  return trx.updateTable('model').set(row).where('id', '=', id).returningAll().executeTakeFirstOrThrow();
}
