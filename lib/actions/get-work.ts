import { listFollowUps, listSignOffs } from '@/db/queries/bench';
import { listStepEntries } from '@/db/queries/step-entries';
import type { Context } from '@/lib/context';
import type { Work } from '@/lib/schemas/work';
import { accessTask } from './access';
import { loadBench } from './load-bench';
import { listAtTask } from './see-at-task';
import { toEntry, toFollowUps, toSignOffs } from './shape-work';

/** A task at the bench. Throws `not_found`, `forbidden`. */
export async function getWork(ctx: Context, taskId: string): Promise<Work> {
  await accessTask(ctx, taskId, 'task.read');
  const [bench, entries, present, followUps, signOffs] = await Promise.all([
    loadBench(ctx.db, taskId),
    listStepEntries(ctx.db, taskId),
    listAtTask(ctx, taskId),
    listFollowUps(ctx.db, taskId),
    listSignOffs(ctx.db, taskId),
  ]);
  const { row } = bench;
  return {
    taskId,
    unitId: row.unit_id,
    steps: [...bench.steps],
    counts: bench.counts,
    specs: bench.specs,
    only: bench.only,
    holdsUnit: row.holds_unit,
    wants: { secondPerson: row.wants_second_person, testRide: row.wants_test_ride },
    entries: entries.map(toEntry),
    present,
    followUps: toFollowUps(followUps),
    signOffs: toSignOffs(signOffs, entries),
    endedAt: row.ended_at?.toISOString() ?? null,
  };
}
