import type { Per, Step } from '@/lib/domain/procedure';
import { joinWords } from '@/lib/domain/words';

export const stepKindWords: Record<Step['kind'], string> = {
  check: 'Check',
  measurement: 'Measure',
  note: 'Note',
  photo: 'Picture',
  caution: 'Caution',
};

/** What a step is done once for; nothing for the unit as a whole. */
export const perWords: Record<Per, string | null> = {
  unit: null,
  engine: 'for each engine',
  cylinder: 'for each cylinder',
  carb: 'for each carburettor',
};

const stageWords = { found: 'as found', left: 'as left' };

/** Before and after the work, or only one: 'as found and as left, in psi'. */
export function describeMeasures({ stages, unit }: NonNullable<Step['measures']>): string {
  const when = joinWords(stages.map((stage) => stageWords[stage]));
  return unit ? `${when}, in ${unit}` : when;
}

/** When a step is done at all: 'Only where step 4 or step 5 failed.'; null for one that always is. */
export function describeWhen({ when }: Step, steps: readonly Step[]): string | null {
  if (!when) return null;
  const numberOf = (key: string) => steps.findIndex((step) => step.key === key) + 1;
  const said = when.map(
    ({ step, outcome }) => `step ${numberOf(step)} ${outcome === 'fail' ? 'failed' : 'passed'}`,
  );
  return `Only where ${joinWords(said, 'or')}.`;
}

/** What a failing step calls for. */
export function describeOnFail({ onFail }: Step): string | null {
  if (!onFail) return null;
  const what = onFail.open === 'task' ? 'a task' : 'a defect';
  return `If it fails: ${what}, “${onFail.title}”${onFail.holdsUnit ? ', that holds the unit' : ''}.`;
}

/** What an earlier step found, this one tests again: 'Tests step 4 again.'; null for one that does not. */
export function describeRetest({ retests }: Step, steps: readonly Step[]): string | null {
  if (!retests) return null;
  return `Tests step ${steps.findIndex((step) => step.key === retests) + 1} again, after the work.`;
}
