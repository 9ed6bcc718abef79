import {
  sql,
  type Insertable,
  type Kysely,
  type Selectable,
  type Transaction,
  type Updateable,
} from 'kysely';
import type { DB, PartTable } from '../tables';

export type PartRow = Selectable<PartTable>;

/** The parts in use, or all of them, in no order. */
export function listParts(db: Kysely<DB>, { retired }: { retired: boolean }): Promise<PartRow[]> {
  let query = db.selectFrom('part').selectAll();
  if (!retired) query = query.where('retired_at', 'is', null);
  return query.execute();
}

/** The parts with these ids, retired ones too. */
export function listPartsOf(db: Kysely<DB>, ids: readonly string[]): Promise<PartRow[]> {
  return db
    .selectFrom('part')
    .selectAll()
    .where('id', '=', sql<string>`any(${[...ids]}::uuid[])`)
    .execute();
}

/** The part, retired or in use. */
export function findPart(db: Kysely<DB>, id: string): Promise<PartRow | undefined> {
  return db.selectFrom('part').selectAll().where('id', '=', id).executeTakeFirst();
}

/** Locks parts against every other writer of them, but not against new moves of them, until the transaction ends. Answers them as they are now. */
export function lockParts(trx: Transaction<DB>, ids: readonly string[]): Promise<PartRow[]> {
  return trx
    .selectFrom('part')
    .selectAll()
    .where('id', '=', sql<string>`any(${[...ids]}::uuid[])`)
    .orderBy('id')
    .forNoKeyUpdate()
    .execute();
}

/** Adds a part. The index `part_number` keeps one part in use a number. */
export async function insertPart(trx: Transaction<DB>, row: Insertable<PartTable>): Promise<void> {
  await trx.insertInto('part').values(row).execute();
}

/** Changes the columns named of a part. */
export async function updatePart(
  trx: Transaction<DB>,
  id: string,
  set: Updateable<PartTable>,
): Promise<void> {
  await trx.updateTable('part').set(set).where('id', '=', id).execute();
}

export type ContentRow = {
  kit_id: string;
  part_id: string;
  number: string;
  name: string;
  quantity: number;
};

/** What is in these kits, by the parts' names. */
export function listContents(db: Kysely<DB>, kitIds: readonly string[]): Promise<ContentRow[]> {
  return db
    .selectFrom('kit_part as k')
    .innerJoin('part as p', 'p.id', 'k.part_id')
    .where('k.kit_id', '=', sql<string>`any(${[...kitIds]}::uuid[])`)
    .select(['k.kit_id', 'k.part_id', 'p.number', 'p.name', 'k.quantity'])
    .orderBy('p.name')
    .orderBy('p.id')
    .execute();
}

/** Puts these contents in place of a kit's. */
export async function replaceContents(
  trx: Transaction<DB>,
  kitId: string,
  contents: readonly { partId: string; quantity: number }[],
): Promise<void> {
  await trx.deleteFrom('kit_part').where('kit_id', '=', kitId).execute();
  if (contents.length === 0) return;
  await trx
    .insertInto('kit_part')
    .values(contents.map(({ partId, quantity }) => ({ kit_id: kitId, part_id: partId, quantity })))
    .execute();
}

/** The kits in use that hold a part, by name. */
export function listKitsWith(db: Kysely<DB>, partId: string) {
  return db
    .selectFrom('kit_part as k')
    .innerJoin('part as kit', 'kit.id', 'k.kit_id')
    .where('k.part_id', '=', partId)
    .where('kit.retired_at', 'is', null)
    .select(['kit.id', 'kit.name', 'k.quantity'])
    .orderBy('kit.name')
    .execute();
}

/** The rules in force that name a part, by name. */
export function listRulesWith(db: Kysely<DB>, partId: string) {
  return db
    .selectFrom('rule')
    .select(['id', 'name', 'parts'])
    .where('ended_at', 'is', null)
    .where(sql<boolean>`parts @> ${JSON.stringify([{ partId }])}::jsonb`)
    .orderBy('name')
    .execute();
}
