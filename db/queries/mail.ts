import type { Insertable, Kysely } from 'kysely';
import type { DB, MailTable } from '../tables';

/** Stores a letter that is to be sent and answers its id. */
export async function insertMail(db: Kysely<DB>, row: Insertable<MailTable>): Promise<string> {
  const { id } = await db.insertInto('mail').values(row).returning('id').executeTakeFirstOrThrow();
  return id;
}
