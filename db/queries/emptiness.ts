import type { Kysely } from 'kysely';
import type { DB } from '../tables';

/** True when nobody has set up an operator here yet. */
export async function databaseIsEmpty(db: Kysely<DB>): Promise<boolean> {
  const operator = await db.selectFrom('operator').select('id').executeTakeFirst();
  return operator === undefined;
}
