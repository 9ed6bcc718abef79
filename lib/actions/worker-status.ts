import { getQueueStatus } from '@/db/queries/workers';
import type { Context } from '@/lib/context';
import type { WorkerStatus } from '@/lib/schemas/worker';
import { requireFleetWide } from './access';

/** Without a beat for so long no worker counts as alive: the longest limit a worker can be set to (jobs/limits.ts). */
export const GONE_AFTER_MS = 15_000;

/**
 * How many workers live, and for how many seconds the job that waits longest could have run, in one query. A job
 * in the hands of a worker that is gone counts as waiting.
 */
export async function workerStatus(ctx: Context): Promise<WorkerStatus> {
  requireFleetWide(ctx, 'worker.read');
  const { workers, lagSeconds } = await getQueueStatus(ctx.db, GONE_AFTER_MS);
  return { lagSeconds, alive: workers > 0, workers };
}
