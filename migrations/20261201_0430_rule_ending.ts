import { sql, type Kysely } from 'kysely';

/** Why a rule was ended, as whoever ended it put it. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`alter table rule add column end_reason text`.execute(db);
}
