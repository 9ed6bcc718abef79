import type { Kysely } from 'kysely';
import type { DB } from '../tables';

/** The operator this server is for, once it is set up. */
export function findOperator(db: Kysely<DB>): Promise<{ name: string } | undefined> {
  return db.selectFrom('operator').select('name').executeTakeFirst();
}

/** Names the operator. A second one breaks the unique index `operator_only_one_key`. */
export async function insertOperator(db: Kysely<DB>, name: string, now: Date): Promise<void> {
  await db.insertInto('operator').values({ name, created_at: now }).execute();
}
