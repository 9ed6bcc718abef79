import { setTimeout as wait } from 'node:timers/promises';
import type { IsolationLevel, Kysely, Transaction } from 'kysely';
import type { DB } from './tables';

/** serialization_failure and deadlock_detected: PostgreSQL asks for the whole transaction again. */
const RETRYABLE = new Set(['40001', '40P01']);
const ATTEMPTS = 4;

export const isRetryable = (error: unknown): boolean =>
  error instanceof Error && 'code' in error && RETRYABLE.has(String(error.code));

/**
 * Runs `work` in one transaction and answers what it answers. On a deadlock or a serialization failure the whole
 * of `work` runs again, up to 4 times in all, so it must do nothing outside the transaction. Any other error
 * rolls back and is thrown as it is.
 */
export async function runTransaction<T>(
  db: Kysely<DB>,
  work: (trx: Transaction<DB>) => Promise<T>,
  options: { isolation?: IsolationLevel } = {},
): Promise<T> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      const builder = db.transaction();
      const isolated = options.isolation ? builder.setIsolationLevel(options.isolation) : builder;
      return await isolated.execute(work);
    } catch (error) {
      if (attempt >= ATTEMPTS || !isRetryable(error)) throw error;
      await wait(Math.random() * 20 * 2 ** attempt);
    }
  }
}
