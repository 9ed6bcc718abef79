import { listUnitIds } from '@/db/queries/units';
import type { Context } from '@/lib/context';
import { correctDuePoints } from './correct-due-points';
import { openTasks } from './open-tasks';

/**
 * Computes the due points of the whole fleet anew and opens what tasks are missing: a check of ourselves, for
 * whatever changes them is to have them computed when it does. `thorough` takes no fingerprint's word, which was
 * written by the program as it was then. Answers how many units were looked at and how many due points changed.
 */
export async function refreshFleet(
  ctx: Context,
  { thorough = false }: { thorough?: boolean } = {},
): Promise<{ units: number; changed: number }> {
  const unitIds = await listUnitIds(ctx.db);
  const changed = await correctDuePoints(ctx, unitIds, { thorough });
  await openTasks(ctx, 'all');
  return { units: unitIds.length, changed };
}
