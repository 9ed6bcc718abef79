import { migrationsCurrent } from '@/db/migrate';
import type { Context } from '@/lib/context';
import { Refusal } from '@/lib/errors';
import type { Readiness } from '@/lib/schemas/worker';
import { workerStatus } from './worker-status';

/**
 * Whether this server can answer: the database is reached and has this version's migrations. Says how far behind
 * the worker is, which does not make it unready: what may be launched is derived when it is read. Throws
 * `unavailable`.
 */
export async function checkReady(ctx: Context): Promise<Readiness> {
  if (!(await reached(migrationsCurrent(ctx.db)))) {
    throw new Refusal('unavailable', 'The database does not have the migrations of this version.');
  }
  return { database: 'reached', migrations: 'current', worker: await reached(workerStatus(ctx)) };
}

async function reached<T>(asked: Promise<T>): Promise<T> {
  try {
    return await asked;
  } catch (error) {
    if (error instanceof Refusal) throw error;
    throw new Refusal('unavailable', 'The database cannot be reached.');
  }
}
