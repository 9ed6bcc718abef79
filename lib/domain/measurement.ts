import {
  dimensionOf,
  formatMeasured,
  isMeasuredUnit,
  toKept,
  type MeasuredUnit,
  type MeasuredValue,
} from './measured-value';
import { countOf } from './words';

/** How much is allowed: an amount in the spec's unit of measure, or a share of the largest value in percent. */
export type Allowance = { amount: number; of: 'unit' | 'percent' };
/** The limits of one measurement as they are written down, each optional, in the unit of measure named. */
export type Spec = {
  min?: number | undefined;
  max?: number | undefined;
  target?: number | undefined;
  unit?: string | undefined;
  repeats?: number | undefined;
  maxSpread?: Allowance | undefined;
  maxDifference?: Allowance | undefined;
};
/** By the measurement's name. */
export type Specs = Readonly<Record<string, Spec>>;

/** What a measurement is judged by: values as they are kept, `unit` for showing them. */
export type Limits = {
  unit: MeasuredUnit;
  min: number | null;
  max: number | null;
  target: number | null;
  /** Runs wanted. */
  repeats: number;
  /** The largest spread of the runs of one place; an amount is a kept value. */
  maxSpread: Allowance | null;
  /** The largest difference between places (carburettors, cylinders, engines). */
  maxDifference: Allowance | null;
};

export type Verdict = 'in' | 'out' | 'repeats_disagree' | 'places_differ' | 'too_few_repeats' | 'no_limits';
/** A verdict with its reason in plain words and the limits it was judged by. */
export type Judgement = { verdict: Verdict; reason: string; limits: Limits | null };
/** The runs taken at one place: 0 for the unit as a whole, else the number of a carburettor, cylinder or engine. */
export type PlaceRuns = { place: number; runs: readonly MeasuredValue[] };

/** A model's specs with what a unit has of its own: by name, and within a name by field. */
export function mergeSpecs(ofModel: Specs, ofUnit: Specs): Specs {
  const names = new Set([...Object.keys(ofModel), ...Object.keys(ofUnit)]);
  return Object.fromEntries([...names].map((name) => [name, { ...ofModel[name], ...ofUnit[name] }]));
}

/**
 * What a measurement taken in `unit` is judged by; null without a spec that limits anything, or with one in a unit of
 * measure that is none of the same dimension.
 */
export function toLimits(spec: Spec | undefined, unit: MeasuredUnit): Limits | null {
  if (!spec) return null;
  const own = spec.unit ?? unit;
  if (!isMeasuredUnit(own) || dimensionOf(own) !== dimensionOf(unit)) return null;
  const kept = (value: number | undefined) => (value === undefined ? null : toKept(value, own));
  const allowance = (allowed: Allowance | undefined): Allowance | null =>
    !allowed
      ? null
      : allowed.of === 'percent'
        ? allowed
        : { of: 'unit', amount: toKept(allowed.amount, own) };
  const limits: Limits = {
    unit: own,
    min: kept(spec.min),
    max: kept(spec.max),
    target: kept(spec.target),
    repeats: spec.repeats ?? 1,
    maxSpread: allowance(spec.maxSpread),
    maxDifference: allowance(spec.maxDifference),
  };
  const judges = limits.min ?? limits.max ?? limits.maxSpread ?? limits.maxDifference;
  return judges === null && limits.repeats === 1 ? null : limits;
}

/**
 * Judges what was measured at each place: first each by itself, then those that pass against each other. In this
 * order: too few runs say nothing yet; runs that disagree are no measurement; every run must lie within the limits,
 * which belong to what is allowed; places that differ by too much are all marked, for either may be at fault.
 */
export function judgePlaces(places: readonly PlaceRuns[], limits: Limits | null): Map<number, Judgement> {
  const judged = new Map(places.map(({ place, runs }) => [place, judgeRuns(runs, limits)]));
  if (!limits?.maxDifference) return judged;
  const passed = places.filter(({ place }) => judged.get(place)!.verdict === 'in');
  if (passed.length < 2) return judged;
  const means = passed.map(({ place, runs }) => ({ place, mean: meanOf(runs) }));
  const low = means.reduce((a, b) => (b.mean < a.mean ? b : a));
  const high = means.reduce((a, b) => (b.mean > a.mean ? b : a));
  if (allows(limits.maxDifference, low.mean, high.mean)) return judged;
  const reason = `No. ${low.place} has ${formatMeasured(low.mean, limits.unit)}, no. ${high.place} ${formatMeasured(high.mean, limits.unit)}: more apart than ${describeAllowance(limits.maxDifference, limits.unit)}.`;
  for (const { place } of passed) judged.set(place, { verdict: 'places_differ', reason, limits });
  return judged;
}

/** Judges the runs taken at one place by themselves. */
export function judgeRuns(runs: readonly MeasuredValue[], limits: Limits | null): Judgement {
  if (!limits) return { verdict: 'no_limits', reason: 'No limits are given for this.', limits: null };
  const say = (verdict: Verdict, reason: string): Judgement => ({ verdict, reason, limits });
  if (runs.length < limits.repeats)
    return say('too_few_repeats', `${countOf(runs.length, 'run')} of ${limits.repeats} so far.`);
  const values = runs.map(({ value }) => value);
  const [low, high] = [Math.min(...values), Math.max(...values)];
  const shown = (value: number) => formatMeasured(value, limits.unit);
  if (limits.maxSpread && !allows(limits.maxSpread, low, high))
    return say(
      'repeats_disagree',
      `The runs lie between ${shown(low)} and ${shown(high)}: more apart than ${describeAllowance(limits.maxSpread, limits.unit)}.`,
    );
  if (limits.min !== null && isLess(low, limits.min))
    return say('out', `${shown(low)} is below ${shown(limits.min)}.`);
  if (limits.max !== null && isLess(limits.max, high))
    return say('out', `${shown(high)} is above ${shown(limits.max)}.`);
  return say('in', `${describeLimits(limits)}.`);
}

/** The limits in words: '21 psi to 37 psi, 2 runs'. */
export function describeLimits(limits: Limits): string {
  const shown = (value: number) => formatMeasured(value, limits.unit);
  const { min, max, target, repeats, maxSpread, maxDifference, unit } = limits;
  const range =
    min !== null && max !== null
      ? min === max
        ? shown(min)
        : `${shown(min)} to ${shown(max)}`
      : min !== null
        ? `${shown(min)} or more`
        : max !== null
          ? `${shown(max)} or less`
          : null;
  return [
    range,
    target !== null && target !== min ? `aim for ${shown(target)}` : null,
    repeats > 1 ? countOf(repeats, 'run') : null,
    maxSpread ? `runs within ${describeAllowance(maxSpread, unit)}` : null,
    maxDifference ? `places within ${describeAllowance(maxDifference, unit)}` : null,
  ]
    .filter((part) => part !== null)
    .join(', ');
}

function describeAllowance({ amount, of }: Allowance, unit: MeasuredUnit): string {
  return of === 'percent' ? `${amount} % of the largest` : formatMeasured(amount, unit);
}

/** What stands for a place: the mean of its runs, as it is kept. */
export function meanOf(runs: readonly MeasuredValue[]): number {
  return runs.reduce((sum, { value }) => sum + value, 0) / runs.length;
}

function allows({ amount, of }: Allowance, low: number, high: number): boolean {
  const apart = high - low;
  return !isLess(of === 'percent' ? (Math.abs(high) * amount) / 100 : amount, apart);
}

/** Less by more than what turning units of measure into each other rounds. */
function isLess(a: number, b: number): boolean {
  return a < b - 1e-9 * Math.max(Math.abs(a), Math.abs(b), 1e-9);
}
