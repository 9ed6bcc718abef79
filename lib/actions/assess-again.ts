import type { Transaction } from 'kysely';
import { wantAssessments } from '@/db/queries/due-points';
import type { DB } from '@/db/tables';
import { enqueue } from '@/lib/enqueue';

/** Units to a job, so that the worker holds the locks of one for a moment only. */
const BATCH = 200;

/**
 * In the caller's transaction: holds these units as not yet assessed, and puts the work on the queue. For writes
 * that can bring a due point nearer.
 */
export async function assessAgain(trx: Transaction<DB>, unitIds: readonly string[]): Promise<void> {
  if (unitIds.length === 0) return;
  await wantAssessments(trx, unitIds);
  await enqueueRefresh(trx, unitIds);
}

/** In the caller's transaction: puts the refresh of these units' due points on the queue, some at a time. */
export async function enqueueRefresh(trx: Transaction<DB>, unitIds: readonly string[]): Promise<void> {
  for (let from = 0; from < unitIds.length; from += BATCH) {
    await enqueue(trx, 'refresh-due', { unitIds: unitIds.slice(from, from + BATCH) });
  }
}
