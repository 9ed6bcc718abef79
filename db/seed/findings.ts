import { loadBench } from '@/lib/actions/load-bench';
import type { Context } from '@/lib/context';
import type { Spec } from '@/lib/domain/measurement';
import type { Step } from '@/lib/domain/procedure';
import { listPlaces } from '@/lib/domain/step-states';
import type { ClosingResult } from '@/lib/schemas/work';
import type { Chance } from './random';

/** By this many engine hours a measured part has worn from its best to near its limit. */
const WORN_HOURS = 420;

/** What a mechanic found at every required step of a task: all of it in order, each measurement a little worn. */
export async function findAllInOrder(ctx: Context, taskId: string, chance: Chance): Promise<ClosingResult[]> {
  const bench = await loadBench(ctx.db, taskId);
  const wear = Math.min(1, bench.row.engine_hours_tenths / 10 / WORN_HOURS);
  return bench.steps
    .filter(({ kind, required }) => required && kind !== 'caution')
    .filter(({ when }) => !when?.some(({ outcome }) => outcome === 'fail'))
    .flatMap((step) =>
      listPlaces(step.per, bench.counts, bench.only).map((place) => ({
        stepKey: step.key,
        place,
        ...findOne(step, bench.specs[step.measures?.spec ?? ''] ?? {}, wear, chance),
      })),
    );
}

function findOne(
  step: Step,
  spec: Spec,
  wear: number,
  chance: Chance,
): Pick<ClosingResult, 'stage' | 'value'> {
  if (step.kind === 'note') return { value: { kind: 'note', text: 'Nothing unusual.' } };
  if (!step.measures) return { value: { kind: 'check', outcome: 'pass' } };
  const typed = readGauge(spec, wear, chance);
  const runs = Array.from({ length: spec.repeats ?? 1 }, () => ({ typed }));
  return { stage: step.measures.stages[0]!, value: { kind: 'measurement', runs } };
}

/** A value inside the limits: at its target, or from the better end towards the worse as it wears. */
function readGauge({ min, max, target, unit }: Spec, wear: number, chance: Chance): string {
  const near = (value: number, share: number) => value * (1 + (chance.next() - 0.5) * share);
  if (target !== undefined) return String(target);
  if (min !== undefined && max !== undefined)
    return round(near(max - (max - min) * (0.25 + 0.5 * wear), 0.01), unit);
  if (min !== undefined) return round(near(min * (1.22 - 0.17 * wear), 0.015), unit);
  if (max !== undefined) return round(near(max * (0.5 + 0.35 * wear), 0.04), unit);
  return '1';
}

const round = (value: number, unit: string | undefined) => value.toFixed(unit === 'psi' ? 0 : 2);
