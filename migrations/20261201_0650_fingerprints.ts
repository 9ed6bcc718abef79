import { sql, type Kysely } from 'kysely';

/**
 * What a unit's due points were last computed from, and what was stored then, each as one number: a unit of which
 * both still hold need not be computed again. Null until the next refresh.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`alter table assessment add facts_hash bigint, add points_hash bigint`.execute(db);
}
