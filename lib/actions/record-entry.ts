import type { Insertable, Transaction } from 'kysely';
import { listAttachments } from '@/db/queries/attachments';
import { findStepEntry, insertStepEntries, listStepEntries } from '@/db/queries/step-entries';
import { getTaskStanding, lockTask } from '@/db/queries/tasks';
import type { DB, StepEntryTable } from '@/db/tables';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import type { Judgement } from '@/lib/domain/measurement';
import type { StepEntry } from '@/lib/domain/procedure';
import { refuseField } from '@/lib/errors';
import type { RecordEntry, RecordedEntry } from '@/lib/schemas/work';
import { accessTask } from './access';
import { computeBench, loadBench, toStepEntry, type Bench } from './load-bench';
import { refuseEnded } from './refuse-ended';
import { refusingTaken } from './refusing-taken';
import { checkApplies, findSpot, toEntryValue, type Spot } from './shape-entry';
import { toEntry } from './shape-work';

const TAKEN: Parameters<typeof refusingTaken>[0] = {
  step_entry_pkey: ['id', 'Another entry has this id.'],
};

/**
 * Records the result of one step at one place; for a measurement with its verdict and the limits it was judged by.
 * Nothing is overwritten: the latest stands, and the answer names what somebody else entered there since `followsId`.
 * An id that this task has already answers with that entry and writes nothing.
 * Throws `conflict` on `id` when the task has ended, on `stepKey` where the step is not to be done as things stand;
 * `invalid_input` on the field that does not fit the procedure.
 */
export async function recordEntry(ctx: Context, taskId: string, input: RecordEntry): Promise<RecordedEntry> {
  await accessTask(ctx, taskId, 'task.write');
  const at = input.at ?? ctx.now;
  if (at > ctx.now) throw refuseField('at', 'is in the future');
  return refusingTaken(TAKEN, () =>
    runTransaction(ctx.db, async (trx) => {
      const task = await lockTask(trx, taskId);
      const first = await findStepEntry(trx, input.id);
      if (first?.task_id === taskId) return { entry: toEntry(first), overtook: null };
      if (first) throw refuseField('id', 'Another entry has this id.', 'conflict');
      if (task.ended_at) throw refuseEnded(await getTaskStanding(trx, taskId));
      const bench = await loadBench(trx, taskId);
      const spot = findSpot(bench, input);
      const before = await listStepEntries(trx, taskId);
      const stood = before.findLast(
        (row) => row.step_key === input.stepKey && row.place === spot.place && row.stage === spot.stage,
      );
      const entry = { ...toColumns(ctx, bench, spot), follows_id: stood?.id ?? null, entered_at: at };
      const value = toEntryValue(spot.step, input.value);
      if (value.kind === 'photo') await checkPictures(trx, taskId, value.attachmentIds);
      const entries = before.map(toStepEntry);
      checkApplies(computeBench(bench, entries), spot, input.value);
      await insertStepEntries(trx, [{ ...entry, id: input.id, ...judge(bench, spot, entries, value) }]);
      const overtook =
        stood && stood.id !== (input.followsId ?? null) && stood.entered_by !== entry.entered_by
          ? stood
          : null;
      return {
        entry: toEntry((await findStepEntry(trx, input.id))!),
        overtook: overtook && toEntry(overtook),
      };
    }),
  );
}

/** Throws `invalid_input` unless every picture is one of the task's. */
async function checkPictures(trx: Transaction<DB>, taskId: string, ids: readonly string[]): Promise<void> {
  const known = new Set((await listAttachments(trx, { taskId })).map(({ id }) => id));
  for (const [index, id] of ids.entries())
    if (!known.has(id)) throw refuseField(`value.attachmentIds.${index}`, 'is no picture of this task');
}

/** The columns of an entry that do not depend on what was entered. */
export function toColumns(ctx: Context, bench: Bench, { step, place, stage }: Spot) {
  return {
    task_id: bench.row.task_id,
    unit_id: bench.row.unit_id,
    step_key: step.key,
    place,
    stage,
    spec: step.measures?.spec ?? null,
    engine_hours_tenths: bench.row.engine_hours_tenths,
    entered_at: ctx.now,
    entered_by: personIdOf(ctx.actor),
    recorded_at: ctx.now,
  };
}

/** What was entered and, for a measurement, how it is judged beside what stands at the other places. */
export function judge(
  bench: Bench,
  { step, place, stage }: Spot,
  before: readonly StepEntry[],
  value: StepEntry['value'],
): Pick<Insertable<StepEntryTable>, 'value' | 'judged'> {
  let judged: Judgement | null = null;
  if (value.kind === 'measurement') {
    const states = computeBench(bench, [...before, { stepKey: step.key, place, stage, value }]);
    const at = states.find((one) => one.step.key === step.key)?.places.find((one) => one.place === place);
    judged = (stage === 'found' ? at?.foundJudgement : at?.leftJudgement) ?? null;
  }
  return { value: JSON.stringify(value), judged: judged && JSON.stringify(judged) };
}
