import { sql, type Kysely } from 'kysely';
import type { DB } from '@/db/tables';

/** Until a statement on this database waits for a lock that another transaction holds. */
export async function untilSomebodyWaits(db: Kysely<DB>): Promise<void> {
  const waiting = sql`select 1 from pg_stat_activity
    where datname = current_database() and wait_event_type = 'Lock'`;
  while ((await waiting.execute(db)).rows.length === 0);
}
