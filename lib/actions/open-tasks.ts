import { insertTasks, settleTasks } from '@/db/queries/duties';
import type { Context } from '@/lib/context';
import { computeMinutes } from '@/lib/domain/rule';

/**
 * Opens a task for every rule that has come within its lead and every open defect, where none is open yet, and
 * withdraws those that nobody began and that are no longer due (a reading was voided, a rule changed).
 * Running it again changes nothing. `unitIds` narrows it; runs in the caller's transaction when given one.
 */
export async function openTasks(ctx: Context, unitIds: readonly string[] | 'all'): Promise<void> {
  const { db, now } = ctx;
  const work = await settleTasks(db, unitIds, now);
  await insertTasks(
    db,
    work.map(({ labour, carb_count: carbCount, engines, ...task }) => ({
      ...task,
      origin: labour ? ('rule' as const) : ('defect' as const),
      expected_minutes: labour && computeMinutes(labour, { carbCount, engines }),
      opened_at: now,
    })),
  );
}
