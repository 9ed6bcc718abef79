import type { Context } from '@/lib/context';
import { correctDuePoints } from './correct-due-points';
import { openTasks } from './open-tasks';

/**
 * Computes the due points of these units anew from their facts, stores what changed, and opens the tasks that
 * have come within their rule's lead. Running it again changes nothing.
 */
export async function refreshDue(ctx: Context, { unitIds }: { unitIds: readonly string[] }): Promise<void> {
  await correctDuePoints(ctx, unitIds);
  await openTasks(ctx, unitIds);
}
