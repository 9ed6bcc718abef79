import { sql, type Kysely, type RawBuilder } from 'kysely';
import type { DB } from '@/db/tables';
import type { JobName, JobPayload } from '@/lib/schemas/jobs';

type JobOptions = { key?: string; runAt?: Date };

/** Jobs that run one after the other: a mail server that is slow to answer takes up one of the worker's hands. */
const QUEUE: Partial<Record<JobName, string>> = { 'send-mail': 'mail' };

/**
 * Puts a job on the worker's queue in the caller's transaction: it exists if and only if what was written does.
 * Jobs with the same `key` that have not begun are one job; a key whose job is running gets another run after it.
 * A job may run more than once, and must do no harm when it does.
 */
export async function enqueue<N extends JobName>(
  db: Kysely<DB>,
  name: N,
  payload: JobPayload<N>,
  options: JobOptions = {},
): Promise<void> {
  await sql`select ${jobFragment(name, payload, options)}`.execute(db);
}

/** The SQL expression that puts a job on the queue, for a statement that writes and enqueues in one. */
export function jobFragment<N extends JobName>(
  name: N,
  payload: JobPayload<N>,
  options: JobOptions = {},
): RawBuilder<unknown> {
  const key = options.key ? `${name}:${options.key}` : null;
  return sql`put_job(${name}::text, ${JSON.stringify(payload)}::json, ${options.runAt ?? null}::timestamptz,
    ${key}::text, ${QUEUE[name] ?? null}::text)`;
}
