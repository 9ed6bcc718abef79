import { listUnitIds } from '@/db/queries/units';
import type { Context } from '@/lib/context';
import { refreshDue } from './refresh-due';

/** Units to a transaction, so that the locks of one are held for a moment only. */
const BATCH = 200;
/** Batches under way at a time: one is computed while the database reads the other. */
const LANES = 2;

/**
 * Computes the due points of the whole fleet anew: a check of ourselves, for whatever changes them is to have them
 * computed when it does. Answers how many units were looked at and how many due points were not right.
 */
export async function refreshFleet(ctx: Context): Promise<{ units: number; changed: number }> {
  const unitIds = await listUnitIds(ctx.db);
  let changed = 0;
  let next = 0;
  const lane = async () => {
    while (next < unitIds.length) {
      const from = next;
      next += BATCH;
      const found = await refreshDue(ctx, { unitIds: unitIds.slice(from, from + BATCH) });
      changed += found;
    }
  };
  await Promise.all(Array.from({ length: LANES }, lane));
  return { units: unitIds.length, changed };
}
