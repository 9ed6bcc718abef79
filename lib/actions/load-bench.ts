import type { Kysely } from 'kysely';
import { findBench, listFollowUps, listSignOffs, type BenchRow } from '@/db/queries/bench';
import { listStepEntries, type StepEntryRow } from '@/db/queries/step-entries';
import type { DB } from '@/db/tables';
import { checkClosing, type ClosingFault } from '@/lib/domain/closing-check';
import { mergeSpecs, type Specs } from '@/lib/domain/measurement';
import type { OnlyPlace, Step, StepEntry } from '@/lib/domain/procedure';
import type { UnitCounts } from '@/lib/domain/rule';
import { computeSteps, type StepState } from '@/lib/domain/step-states';
import type { SignOff } from '@/lib/schemas/work';
import { toFollowUps, toSignOffs } from './shape-work';

/** What the steps of a task are computed from. */
export type Bench = {
  row: BenchRow;
  steps: readonly Step[];
  counts: UnitCounts;
  specs: Specs;
  only: OnlyPlace | null;
};

/** The bench of a task; its steps are empty for a task without a procedure. Throws when there is no such task. */
export async function loadBench(db: Kysely<DB>, taskId: string): Promise<Bench> {
  const row = await findBench(db, taskId);
  if (!row) throw new Error(`There is no task ${taskId}.`);
  return {
    row,
    steps: row.steps ?? [],
    counts: { engines: row.engines, cylinders: row.cylinders, carbCount: row.carb_count },
    specs: mergeSpecs(row.model_specs, row.unit_specs),
    only: row.only_per && row.only_place !== null ? { per: row.only_per, place: row.only_place } : null,
  };
}

/** Where each step stands with these entries, which are in the order they came in. */
export function computeBench(bench: Bench, entries: readonly StepEntry[]): StepState[] {
  const { steps, counts, specs, only } = bench;
  return computeSteps({ steps, counts, specs, only, entries });
}

/** An entry as the pure rules read it. */
export function toStepEntry(row: StepEntryRow): StepEntry {
  return { stepKey: row.step_key, place: row.place, stage: row.stage, value: row.value };
}

/** What keeps a task from being closed by this person, with what it was computed from. */
export async function checkBench(
  db: Kysely<DB>,
  bench: Bench,
  closerId: string | null,
): Promise<{ faults: ClosingFault[]; states: StepState[]; entries: StepEntryRow[]; signOffs: SignOff[] }> {
  const taskId = bench.row.task_id;
  const entries = await listStepEntries(db, taskId);
  const followUps = await listFollowUps(db, taskId);
  const signOffs = toSignOffs(await listSignOffs(db, taskId), entries);
  const states = computeBench(bench, entries.map(toStepEntry));
  const faults = checkClosing({
    states,
    holdsUnit: bench.row.holds_unit,
    followUps: toFollowUps(followUps),
    signOffs: signOffs.map(({ kind, stands, signedBy }) => ({
      kind,
      stands,
      personId: signedBy.id,
    })),
    wants: { secondPerson: bench.row.wants_second_person, testRide: bench.row.wants_test_ride },
    closerId,
  });
  return { faults, states, entries, signOffs };
}
