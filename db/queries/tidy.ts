import { sql, type Kysely } from 'kysely';
import type { DB } from '../tables';

/** Takes away what nobody needs any more, all of it older than `before`. */
export async function deleteOldRecords(db: Kysely<DB>, before: Date): Promise<void> {
  await sql`
    with attempts as (delete from sign_in_attempt where attempted_at < ${before}),
    sessions as (delete from session where least(expires_at, ended_at) < ${before}),
    resets as (delete from password_reset where expires_at < ${before}),
    letters as (delete from mail where queued_at < ${before} and (sent_at is not null or failure is not null)),
    workers as (delete from worker_heartbeat where stopped_at < ${before})
    select graphile_worker.complete_jobs(array(
      select id from graphile_worker.jobs
       where attempts >= max_attempts and locked_at is null and updated_at < ${before}))`.execute(db);
}
