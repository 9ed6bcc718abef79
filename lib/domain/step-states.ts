import { judgePlaces, toLimits, type Judgement, type Specs } from './measurement';
import type { Condition, EntryValue, OnlyPlace, Per, Stage, Step, StepEntry } from './procedure';
import type { UnitCounts } from './rule';

export type PlaceState = {
  /** 0 for the unit as a whole, else the number of the carburettor, cylinder or engine. */
  place: number;
  /** Whether the step is to be done here; 'waits' until what it depends on is known. */
  applies: 'yes' | 'no' | 'waits';
  /** What was entered; of a measurement as found and as left. */
  entry: EntryValue | null;
  found: EntryValue | null;
  left: EntryValue | null;
  /** The verdicts on the measurement. */
  foundJudgement: Judgement | null;
  leftJudgement: Judgement | null;
  /** How it was found, which decides what depends on it; null while it is not known, or decides nothing. */
  outcome: 'pass' | 'fail' | null;
  /** How it stands at last, which decides whether the work may be closed. */
  last: 'pass' | 'fail' | null;
  /** The later step that says how it stands at last, once it does. */
  settledBy: string | null;
  done: boolean;
};
export type StepState = { step: Step; places: PlaceState[] };

/** The places of a step on a unit; a follow-up has one of those it is for. */
export function listPlaces(per: Per, counts: UnitCounts, only: OnlyPlace | null = null): number[] {
  if (per === 'unit') return [0];
  if (only?.per === per) return [only.place];
  const count = { engine: counts.engines, cylinder: counts.cylinders, carb: counts.carbCount }[per];
  return Array.from({ length: count }, (_, index) => index + 1);
}

export type WorkFacts = {
  steps: readonly Step[];
  counts: UnitCounts;
  specs: Specs;
  entries: readonly StepEntry[];
  only?: OnlyPlace | null;
};

/** Where each step stands at each of its places, in the order of the procedure. */
export function computeSteps({ steps, counts, specs, entries, only = null }: WorkFacts): StepState[] {
  const latest = new Map(entries.map(({ value, ...at }) => [spotOf(at), value]));
  const states: StepState[] = [];
  for (const step of steps) {
    const at = (place: number, stage: Stage | null) => {
      const value = latest.get(spotOf({ stepKey: step.key, place, stage }));
      return value && value.kind !== 'cleared' ? value : null;
    };
    const places = listPlaces(step.per, counts, only);
    const judged = step.measures
      ? {
          found: judgeStage(step, specs, places, (p) => at(p, 'found')),
          left: judgeStage(step, specs, places, (p) => at(p, 'left')),
        }
      : null;
    states.push({
      step,
      places: places.map((place) => {
        const entered = { entry: at(place, null), found: at(place, 'found'), left: at(place, 'left') };
        const foundJudgement = judged?.found.get(place) ?? null;
        const leftJudgement = judged?.left.get(place) ?? null;
        return {
          place,
          applies: computeApplies(step, place, states),
          ...entered,
          foundJudgement,
          leftJudgement,
          settledBy: null,
          ...(step.measures
            ? settleMeasurement(step.measures.stages, foundJudgement, leftJudgement)
            : settleEntry(entered.entry)),
        };
      }),
    });
  }
  return states.map((state) => settleByLater(state, states));
}

/** A step that is wanted and has no result. */
export type MissingResult = { stepKey: string; title: string; place: number; stage: Stage | null };

/** What keeps work from being closed: every required step that applies and is not done, in order. */
export function findMissing(states: readonly StepState[]): MissingResult[] {
  return states.flatMap(({ step, places }) =>
    step.required && step.kind !== 'caution'
      ? places
          .filter((state) => state.applies === 'yes' && !state.done)
          .map((state) => ({
            stepKey: step.key,
            title: step.title,
            place: state.place,
            stage: missingStage(step, state),
          }))
      : [],
  );
}

/**
 * Steps that have failed and stand as failed: what a rule that holds the unit must not be closed over. Where a later
 * step says how one stands, the failure is that one's.
 */
export function findOpenFailures(states: readonly StepState[]): { step: Step; place: number }[] {
  return states.flatMap(({ step, places }) =>
    places
      .filter(({ applies, last, settledBy }) => applies === 'yes' && last === 'fail' && settledBy === null)
      .map(({ place }) => ({ step, place })),
  );
}

/** How many required results are in, of how many. Those that wait or do not apply count as neither. */
export function countDone(states: readonly StepState[]): { done: number; of: number } {
  const wanted = states.flatMap(({ step, places }) =>
    step.required && step.kind !== 'caution' ? places.filter(({ applies }) => applies === 'yes') : [],
  );
  return { done: wanted.filter(({ done }) => done).length, of: wanted.length };
}

/** Any of the conditions is enough; while none is met and one is not known yet, the step waits. */
function computeApplies(step: Step, place: number, earlier: readonly StepState[]): PlaceState['applies'] {
  if (!step.when) return 'yes';
  const met = step.when.map((condition) => meets(condition, step, place, earlier));
  return met.includes('yes') ? 'yes' : met.includes('waits') ? 'waits' : 'no';
}

/**
 * Place by place where both steps are done once for the same thing. A step done once for the unit follows when any
 * place came out like that; so does one done for another thing.
 */
function meets(
  { step: key, outcome: wanted }: Condition,
  step: Step,
  place: number,
  earlier: readonly StepState[],
): PlaceState['applies'] {
  const on = earlier.find((state) => state.step.key === key);
  if (!on) return 'no';
  const places = on.step.per === step.per ? on.places.filter((state) => state.place === place) : on.places;
  if (places.some(({ applies, outcome }) => applies === 'yes' && outcome === wanted)) return 'yes';
  return places.some(({ applies, done }) => applies === 'waits' || (applies === 'yes' && !done))
    ? 'waits'
    : 'no';
}

const spotOf = ({ stepKey, place, stage }: Omit<StepEntry, 'value'>) => `${stepKey} ${place} ${stage ?? ''}`;

function judgeStage(
  step: Step,
  specs: Specs,
  places: readonly number[],
  at: (place: number) => EntryValue | null,
): Map<number, Judgement> {
  const { spec, unit } = step.measures!;
  const taken = places.flatMap((place) => {
    const value = at(place);
    return value?.kind === 'measurement' && value.runs.length > 0 ? [{ place, runs: value.runs }] : [];
  });
  return judgePlaces(taken, toLimits(specs[spec], unit));
}

const passes = ({ verdict }: Judgement) =>
  verdict === 'too_few_repeats'
    ? null
    : verdict === 'in' || verdict === 'no_limits'
      ? ('pass' as const)
      : ('fail' as const);

/** What passes as found may be left alone: it is as left already. What does not is measured again after the work. */
function settleMeasurement(stages: readonly Stage[], found: Judgement | null, left: Judgement | null) {
  const first = stages.includes('found') ? found : left;
  const outcome = first && passes(first);
  const last = left ? passes(left) : stages.includes('found') ? outcome : null;
  const settled =
    outcome !== null &&
    (outcome === 'pass' || !stages.includes('left') || (left !== null && passes(left) !== null));
  return { outcome, last, done: settled };
}

/**
 * How a step stands at last may be said by a later one: one that tests it again, or one that measures as left what it
 * measured as found.
 */
function settleByLater(state: StepState, states: readonly StepState[]): StepState {
  const { step } = state;
  const later = states.filter((other) => other.step.per === step.per && saysLast(other.step, step));
  if (later.length === 0) return state;
  return {
    ...state,
    places: state.places.map((one) => {
      const said = later
        .flatMap(({ step: { key }, places }) => places.map((place) => ({ key, place })))
        .findLast(({ place }) => place.place === one.place && place.applies === 'yes' && place.last !== null);
      return said ? { ...one, last: said.place.last, settledBy: said.key } : one;
    }),
  };
}

function saysLast(later: Step, step: Step): boolean {
  if (later.retests === step.key) return true;
  const { measures } = step;
  return (
    measures !== undefined &&
    !measures.stages.includes('left') &&
    later.measures?.spec === measures.spec &&
    later.measures.stages.includes('left')
  );
}

function settleEntry(entry: EntryValue | null): Pick<PlaceState, 'outcome' | 'last' | 'done'> {
  if (entry?.kind === 'check') {
    const outcome = entry.outcome === 'not_applicable' ? null : entry.outcome;
    return { outcome, last: outcome, done: true };
  }
  const done =
    (entry?.kind === 'note' && entry.text.trim() !== '') ||
    (entry?.kind === 'photo' && entry.attachmentIds.length > 0);
  return { outcome: null, last: null, done };
}

function missingStage(step: Step, { outcome }: PlaceState): Stage | null {
  if (!step.measures) return null;
  return step.measures.stages.includes('found') && outcome === null ? 'found' : 'left';
}
