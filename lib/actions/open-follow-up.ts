import type { Transaction } from 'kysely';
import { listFollowUps } from '@/db/queries/bench';
import { insertDefect } from '@/db/queries/defects';
import { findCurrentVersionId } from '@/db/queries/procedures';
import { listStepEntries } from '@/db/queries/step-entries';
import { getTaskStanding, insertTask, lockTask, type TaskRow } from '@/db/queries/tasks';
import { lockUnits } from '@/db/queries/units';
import type { DB } from '@/db/tables';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { describePlace } from '@/lib/domain/closing-check';
import type { Step } from '@/lib/domain/procedure';
import { refuseField } from '@/lib/errors';
import type { OpenFollowUp, Work } from '@/lib/schemas/work';
import { accessTask } from './access';
import { enqueueRefresh } from './assess-again';
import { getWork } from './get-work';
import { computeBench, loadBench, toStepEntry, type Bench } from './load-bench';
import { refuseEnded } from './refuse-ended';
import { refusingTaken } from './refusing-taken';
import { findSpot, type Spot } from './shape-entry';
import { toFollowUps } from './shape-work';

/**
 * Opens what a failed step calls for, for its place alone: a defect, for which the worker opens a repair, or a task
 * that follows the step's procedure, with a holding defect where the step says so. A step that calls for nothing
 * gets a holding defect. A place that has an open follow-up of this step keeps that one, and nothing is written.
 * Throws `conflict` on `id` when the task has ended, on `stepKey` where the step does not stand as failed.
 */
export async function openFollowUp(ctx: Context, taskId: string, input: OpenFollowUp): Promise<Work> {
  const seen = await accessTask(ctx, taskId, 'task.write');
  await refusingTaken(
    { defect_pkey: ['id', 'Something else has this id.'], task_pkey: ['id', 'Something else has this id.'] },
    () =>
      runTransaction(ctx.db, async (trx) => {
        await lockUnits(trx, [seen.unit_id]);
        const task = await lockTask(trx, taskId);
        const bench = await loadBench(trx, taskId);
        const spot = findSpot(bench, { ...input, stage: anyStage(bench, input.stepKey) });
        const standing = toFollowUps(await listFollowUps(trx, taskId)).find(
          ({ stepKey, place, state }) =>
            stepKey === spot.step.key && place === spot.place && state === 'open',
        );
        if (standing) return;
        if (task.ended_at) throw refuseEnded(await getTaskStanding(trx, taskId));
        const entryId = await findFailedEntry(trx, bench, spot);
        await insertFollowUp(ctx, trx, { task: seen, bench, spot, entryId, id: input.id });
        await enqueueRefresh(trx, [seen.unit_id]);
      }),
  );
  return getWork(ctx, taskId);
}

/** A follow-up is of a step and place, not of a stage of a measurement. */
function anyStage(bench: Bench, stepKey: string) {
  return bench.steps.find(({ key }) => key === stepKey)?.measures?.stages[0];
}

/** The latest entry at a spot that stands as failed. Throws `conflict` where it does not. */
async function findFailedEntry(trx: Transaction<DB>, bench: Bench, { step, place }: Spot): Promise<string> {
  const rows = await listStepEntries(trx, bench.row.task_id);
  const state = computeBench(bench, rows.map(toStepEntry))
    .find((one) => one.step.key === step.key)
    ?.places.find((one) => one.place === place);
  const entry = rows.findLast((row) => row.step_key === step.key && row.place === place);
  if (!entry || state?.applies !== 'yes' || (state.last !== 'fail' && state.outcome !== 'fail'))
    throw refuseField('stepKey', 'has not failed there: nothing is to follow', 'conflict');
  return entry.id;
}

async function insertFollowUp(
  ctx: Context,
  trx: Transaction<DB>,
  of: { task: TaskRow; bench: Bench; spot: Spot; entryId: string; id: string },
): Promise<void> {
  const { task, bench, spot, entryId, id } = of;
  const { step, place } = spot;
  const wanted: NonNullable<Step['onFail']> = step.onFail ?? {
    open: 'defect',
    title: `Failed: ${step.title}`,
    holdsUnit: true,
  };
  const where = describePlace(step.per, place);
  const title = (where ? `${wanted.title}, ${where}` : wanted.title).slice(0, 120);
  const opened = { unit_id: task.unit_id, title, detail: `From “${task.title}”, step “${step.title}”.` };
  const by = personIdOf(ctx.actor);
  const defect =
    wanted.open === 'defect' || wanted.holdsUnit
      ? await insertDefect(trx, {
          ...opened,
          id,
          holds_unit: wanted.holdsUnit,
          reported_at: ctx.now,
          reported_by: by,
          step_entry_id: entryId,
        })
      : null;
  if (wanted.open === 'defect') return;
  const versionId = wanted.procedureId ? await findCurrentVersionId(trx, wanted.procedureId) : null;
  await insertTask(trx, {
    ...opened,
    ...(defect ? {} : { id }),
    kind: wanted.kind ?? 'repair',
    origin: 'defect',
    defect_id: defect?.id ?? null,
    procedure_version_id: versionId ?? null,
    only_per: step.per === 'unit' ? null : step.per,
    only_place: step.per === 'unit' ? null : place,
    step_entry_id: entryId,
    wants_second_person: bench.row.wants_second_person,
    wants_test_ride: bench.row.wants_test_ride,
    opened_at: ctx.now,
    opened_by: by,
  });
}
