import { freeJobsOfGoneWorkers, replaceHeartbeat } from '@/db/queries/workers';
import type { Context } from '@/lib/context';

/**
 * Records that a worker lives, then puts the jobs of workers without a beat for `goneAfterMs` back on the queue.
 * `alive` is false when this worker was itself taken for dead: others may have its jobs, so it must end.
 */
export async function beatWorker(
  { db }: Context,
  { workerId, goneAfterMs }: { workerId: string; goneAfterMs: number },
): Promise<{ alive: boolean; gone: string[] }> {
  const alive = await replaceHeartbeat(db, workerId);
  return { alive, gone: alive ? await freeJobsOfGoneWorkers(db, goneAfterMs) : [] };
}
