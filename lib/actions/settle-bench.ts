import type { Insertable, Transaction } from 'kysely';
import { insertStepEntries, listStepEntries, type StepEntryRow } from '@/db/queries/step-entries';
import type { DB, StepEntryTable } from '@/db/tables';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import type { ClosedResult, ClosedSignOff } from '@/lib/domain/closed-work';
import type { StepState } from '@/lib/domain/step-states';
import { Refusal, refuseField } from '@/lib/errors';
import type { ClosingResult } from '@/lib/schemas/work';
import { checkBench, computeBench, loadBench, toStepEntry, type Bench } from './load-bench';
import { judge, toColumns } from './record-entry';
import { checkApplies, findSpot, toEntryValue } from './shape-entry';
import { toNamed } from './shape-task';

/**
 * What a closing finds at the bench, after `results` given with it are recorded as entries: every result that stands,
 * with its verdict and limits, and who signed. The caller has locked the task.
 * Throws `invalid_input` on `results` that do not fit the procedure; `conflict` with every reason for which the work
 * is not finished, on `results` or `signOffs`.
 */
export async function settleBench(
  ctx: Context,
  trx: Transaction<DB>,
  taskId: string,
  results: readonly ClosingResult[],
): Promise<{ results: ClosedResult[]; signOffs: ClosedSignOff[] }> {
  const bench = await loadBench(trx, taskId);
  if (results.length > 0) await recordResults(ctx, trx, bench, results);
  const { faults, states, entries, signOffs } = await checkBench(trx, bench, personIdOf(ctx.actor));
  if (faults.length > 0)
    throw new Refusal(
      'conflict',
      faults.length === 1
        ? faults[0]!.message
        : `${faults.length} things are open before this can be closed.`,
      faults.map(({ on, message }) => ({
        path: on === 'missing' || on === 'failed' ? 'results' : 'signOffs',
        message,
      })),
    );
  return {
    results: freezeResults(states, entries),
    signOffs: signOffs.map(({ kind, note, signedAt, signedBy }) => ({ kind, note, signedAt, signedBy })),
  };
}

/** Records results in their order, each as an entry made now. */
async function recordResults(
  ctx: Context,
  trx: Transaction<DB>,
  bench: Bench,
  results: readonly ClosingResult[],
): Promise<void> {
  if (bench.steps.length === 0)
    throw refuseField('results', 'this task has no procedure to give results for');
  const standing = await listStepEntries(trx, bench.row.task_id);
  const entries = standing.map(toStepEntry);
  const rows: Insertable<StepEntryTable>[] = [];
  for (const [index, result] of results.entries()) {
    const path = `results.${index}.`;
    const spot = findSpot(bench, result, path);
    const value = toEntryValue(spot.step, result.value, path);
    checkApplies(computeBench(bench, entries), spot, result.value, path);
    rows.push({ ...toColumns(ctx, bench, spot), ...judge(bench, spot, entries, value) });
    entries.push({ stepKey: spot.step.key, place: spot.place, stage: spot.stage, value });
  }
  await insertStepEntries(trx, rows);
}

/** The results that stand where their step applies, in the order of the procedure. */
function freezeResults(states: readonly StepState[], entries: readonly StepEntryRow[]): ClosedResult[] {
  return states.flatMap(({ step, places }) =>
    places
      .filter(({ applies }) => applies === 'yes')
      .flatMap((state) =>
        (['found', 'left', null] as const).flatMap((stage) => {
          const row = entries.findLast(
            (one) => one.step_key === step.key && one.place === state.place && one.stage === stage,
          );
          if (!row || row.value.kind === 'cleared') return [];
          const judged =
            stage === 'found' ? state.foundJudgement : stage === 'left' ? state.leftJudgement : null;
          return [
            {
              stepKey: step.key,
              title: step.title,
              per: step.per,
              place: state.place,
              stage,
              unit: step.measures?.unit ?? null,
              value: row.value,
              judged,
              enteredAt: row.entered_at.toISOString(),
              enteredBy: toNamed(row.entered_by, row.author_name),
            },
          ];
        }),
      ),
  );
}
