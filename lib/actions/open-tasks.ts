import {
  listDuties,
  listDefectsWithoutTask,
  insertTasks,
  withdrawTasksNoLongerDue,
} from '@/db/queries/duties';
import type { Context } from '@/lib/context';
import { computeMinutes } from '@/lib/domain/rule';

/**
 * Opens a task for every rule that has come within its lead and every open defect, where none is open yet, and
 * withdraws those that nobody began and that are no longer due (a reading was voided, a rule changed).
 * Running it again changes nothing. `unitIds` narrows it; runs in the caller's transaction when given one.
 */
export async function openTasks(ctx: Context, unitIds: readonly string[] | 'all'): Promise<void> {
  const { db, now } = ctx;
  await withdrawTasksNoLongerDue(db, unitIds, now);
  const duties = await listDuties(db, unitIds, now);
  const defects = await listDefectsWithoutTask(db, unitIds);
  await insertTasks(db, [
    ...duties.map((duty) => ({
      unit_id: duty.unit_id,
      kind: duty.kind,
      title: duty.name,
      origin: 'rule' as const,
      rule_id: duty.rule_id,
      expected_minutes: computeMinutes(duty.labour, { carbCount: duty.carb_count, engines: duty.engines }),
      opened_at: now,
    })),
    ...defects.map((defect) => ({
      unit_id: defect.unit_id,
      kind: 'repair' as const,
      title: defect.title,
      detail: defect.detail,
      origin: 'defect' as const,
      defect_id: defect.id,
      opened_at: now,
    })),
  ]);
}
