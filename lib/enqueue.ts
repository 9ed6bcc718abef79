import { sql, type Kysely } from 'kysely';
import type { DB } from '@/db/tables';
import type { JobName, JobPayload } from '@/lib/schemas/jobs';

/**
 * Puts a job on the worker's queue in the caller's transaction: it exists if and only if what was written does.
 * Jobs with the same `key` that have not begun are one job; a key whose job is running gets another run after it.
 * A job may run more than once, and must do no harm when it does.
 */
export async function enqueue<N extends JobName>(
  db: Kysely<DB>,
  name: N,
  payload: JobPayload<N>,
  options: { key?: string; runAt?: Date } = {},
): Promise<void> {
  const key = options.key ? `${name}:${options.key}` : null;
  await sql`select graphile_worker.add_job(${name}, ${JSON.stringify(payload)}::json,
    run_at => ${options.runAt ?? null}::timestamptz, job_key => ${key})`.execute(db);
}
