import { parseMeasured } from '@/lib/domain/measured-value';
import { describePlace } from '@/lib/domain/closing-check';
import type { EntryValue, Stage, Step } from '@/lib/domain/procedure';
import { listPlaces, type StepState } from '@/lib/domain/step-states';
import { Refusal, refuseField, type FieldError } from '@/lib/errors';
import type { ClosingResult, EntryInput } from '@/lib/schemas/work';
import type { Bench } from './load-bench';

/** Where on the bench an entry belongs. */
export type Spot = { step: Step; place: number; stage: Stage | null };

/**
 * The step, place and stage that an entry names. `path` leads to the entry within what was sent: '' or `results.3.`.
 * Throws `invalid_input` on the field that names what the procedure does not have.
 */
export function findSpot(bench: Bench, input: Omit<ClosingResult, 'value'>, path = ''): Spot {
  const step = bench.steps.find(({ key }) => key === input.stepKey);
  if (!step) throw refuseField(`${path}stepKey`, 'is no step of this task');
  const places = listPlaces(step.per, bench.counts, bench.only);
  if (!places.includes(input.place))
    throw refuseField(
      `${path}place`,
      places[0] === 0
        ? 'is 0 for a step that is done once'
        : `is one of ${places.join(', ') || 'none: this unit has none'}`,
    );
  const stage = input.stage ?? null;
  if (step.measures && (stage === null || !step.measures.stages.includes(stage)))
    throw refuseField(`${path}stage`, `is ${step.measures.stages.join(' or ')}`);
  if (!step.measures && stage !== null) throw refuseField(`${path}stage`, 'belongs to a measurement');
  return { step, place: input.place, stage };
}

/** Throws `conflict` unless the step is to be done at its place as things stand; clearing is always allowed. */
export function checkApplies(
  states: readonly StepState[],
  { step, place }: Spot,
  value: EntryInput,
  path = '',
): void {
  if (value.kind === 'cleared') return;
  const state = states
    .find((one) => one.step.key === step.key)
    ?.places.find((one) => one.place === place)?.applies;
  if (state === 'yes') return;
  const where = describePlace(step.per, place);
  throw refuseField(
    `${path}stepKey`,
    state === 'waits'
      ? `waits for the steps it depends on${where && `, ${where}`}: enter those first.`
      : `is left alone${where && ` on ${where}`}: the steps it depends on came out so.`,
    'conflict',
  );
}

/** What was entered as it is kept. Throws `invalid_input` on `value`, or on the run that cannot be read. */
export function toEntryValue(step: Step, value: EntryInput, path = ''): EntryValue {
  if (value.kind === 'cleared') return value;
  if (step.kind === 'caution') throw refuseField(`${path}stepKey`, 'is a caution: nothing is entered for it');
  if (value.kind !== step.kind) throw refuseField(`${path}value.kind`, `is ${step.kind} for this step`);
  if (value.kind !== 'measurement') return value;
  const errors: FieldError[] = [];
  const runs = value.runs.flatMap(({ typed, unit }, index) => {
    const read = parseMeasured(typed, unit ?? step.measures!.unit);
    if (!('fault' in read)) return [read];
    errors.push({ path: `${path}value.runs.${index}.typed`, message: read.fault });
    return [];
  });
  if (errors.length > 0)
    throw new Refusal(
      'invalid_input',
      errors.map(({ path: at, message }) => `${at}: ${message}`).join('; '),
      errors,
    );
  return { kind: 'measurement', runs, ...(value.note && { note: value.note }) };
}
