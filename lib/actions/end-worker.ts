import { insertWorkerEnd } from '@/db/queries/workers';
import type { Context } from '@/lib/context';

/** Records that a worker ended of its own accord, and puts back what it did not get done. */
export async function endWorker({ db }: Context, { workerId }: { workerId: string }): Promise<void> {
  await insertWorkerEnd(db, workerId);
}
