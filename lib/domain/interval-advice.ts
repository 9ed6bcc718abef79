/** When to rebuild what wears out. Advice to people, never a change of a rule. */
import { findZero, fitWeibull, type Life } from './reliability';

/** Costs of one rebuild, planned and after a failure, in whole cents. */
export type RebuildCosts = { plannedCents: number; unplannedCents: number };

/** Hours are those of the lives; costs are cents an hour. */
export type IntervalAdvice =
  | {
      kind: 'rebuild_at';
      hours: number;
      centsPerHour: number;
      /** What the present interval costs; null without one. */
      presentCentsPerHour: number | null;
      runToFailureCentsPerHour: number;
    }
  | { kind: 'none'; reason: 'too_few_failures' | 'wear_out_not_shown' | 'failure_costs_no_more' };

/** Fewer failures than these are no ground for advice, whatever they look like. */
const FEWEST_FAILURES = 5;
/** Beyond so many times the scale hardly anything is left to rebuild. */
const FURTHEST = 10;
const STEPS = 2_000;

/**
 * Advice on a rebuild's interval from the lives so far. None is given with fewer than five failures; when wear-out is
 * not shown, that is, a shape of 1 or less is within its 95 % bound (then a rebuild renews nothing that matters); or
 * when a failure costs no more than a planned rebuild.
 */
export function adviseInterval(
  lives: readonly Life[],
  costs: RebuildCosts,
  presentHours: number | null,
): IntervalAdvice {
  const fit = fitWeibull(lives);
  if (!fit || fit.failures < FEWEST_FAILURES) return { kind: 'none', reason: 'too_few_failures' };
  if (costs.unplannedCents <= costs.plannedCents) return { kind: 'none', reason: 'failure_costs_no_more' };
  const hours = fit.shapeAtLeast > 1 ? computeOptimum(fit, costs) : null;
  if (hours === null) return { kind: 'none', reason: 'wear_out_not_shown' };
  return {
    kind: 'rebuild_at',
    hours,
    centsPerHour: computeCost(fit, costs, hours),
    presentCentsPerHour: presentHours === null ? null : computeCost(fit, costs, presentHours),
    runToFailureCentsPerHour: computeCost(fit, costs, FURTHEST * fit.scale),
  };
}

type Weibull = { shape: number; scale: number };

const outlasting = ({ shape, scale }: Weibull, hours: number) => Math.exp(-((hours / scale) ** shape));

/** Mean hours run by an item that is rebuilt at `hours` if it has not failed before: Simpson's rule. */
function meanRun(weibull: Weibull, hours: number): number {
  const width = hours / STEPS;
  let sum = 1 + outlasting(weibull, hours);
  for (let step = 1; step < STEPS; step += 1) sum += (step % 2 ? 4 : 2) * outlasting(weibull, step * width);
  return (sum * width) / 3;
}

/** Long-run cost of an hour when rebuilt at `hours` or at failure (R. E. Barlow and L. Hunter 1960: age replacement). */
export function computeCost(
  weibull: Weibull,
  { plannedCents, unplannedCents }: RebuildCosts,
  hours: number,
): number {
  const survived = outlasting(weibull, hours);
  return (plannedCents * survived + unplannedCents * (1 - survived)) / meanRun(weibull, hours);
}

/**
 * The hours at which age replacement costs least, or null when there is no finite optimum: with a shape of 1 or
 * less, or a failure that costs no more. Where hazard × mean run + survival − 1 comes to planned / (unplanned −
 * planned), which with a rising hazard happens once. Beyond ten times the scale counts as never.
 */
export function computeOptimum(
  weibull: Weibull,
  { plannedCents, unplannedCents }: RebuildCosts,
): number | null {
  const { shape, scale } = weibull;
  if (shape <= 1 || unplannedCents <= plannedCents) return null;
  const goal = plannedCents / (unplannedCents - plannedCents);
  const falling = (hours: number) => {
    const hazard = (shape / scale) * (hours / scale) ** (shape - 1);
    return goal - (hazard * meanRun(weibull, hours) + outlasting(weibull, hours) - 1);
  };
  const furthest = FURTHEST * scale;
  return falling(furthest) > 0 ? null : findZero(falling, scale / 10_000, furthest);
}
