/**
 * How long things last (IEC 60050-192). A life is the operating hours of one item from new or rebuilt on: to its
 * failure, or to when it was rebuilt unfailed or is still running (censored). Hours are plain numbers, of any unit.
 */
export type Life = { hours: number; failed: boolean };

/** What share of items outlasts `hours`, right after the failures at that hour; its standard error is Greenwood's. */
export type SurvivalStep = {
  hours: number;
  atRisk: number;
  failures: number;
  survival: number;
  error: number;
};

/** Throws RangeError for a life that is no positive number of hours. */
function checkLives(lives: readonly Life[]): void {
  const wrong = lives.find(({ hours }) => !(hours > 0 && Number.isFinite(hours)));
  if (wrong) throw new RangeError(`a life lasts more than 0 hours: ${wrong.hours}`);
}

/**
 * The product limit estimate, a step for each hour at which something failed (E. L. Kaplan and P. Meier 1958;
 * NIST/SEMATECH e-Handbook 8.2.1.5). A life censored at the very hour of a failure was still at risk there.
 */
export function computeSurvival(lives: readonly Life[]): SurvivalStep[] {
  checkLives(lives);
  const failedAt = new Map<number, number>();
  for (const { hours, failed } of lives) if (failed) failedAt.set(hours, (failedAt.get(hours) ?? 0) + 1);
  let [survival, greenwood] = [1, 0];
  return [...failedAt]
    .sort(([a], [b]) => a - b)
    .map(([hours, failures]) => {
      const atRisk = lives.filter((life) => life.hours >= hours).length;
      survival *= 1 - failures / atRisk;
      greenwood += failures / (atRisk * (atRisk - failures));
      return {
        hours,
        atRisk,
        failures,
        survival,
        error: survival === 0 ? 0 : survival * Math.sqrt(greenwood),
      };
    });
}

/**
 * A Weibull distribution of lives: the share exp(−(t / scale)^shape) outlasts t. A shape above 1 is wear-out; the
 * least and most it may be are its 90 % interval by likelihood ratio, so the least is exceeded with 95 % confidence.
 */
export type WeibullFit = {
  shape: number;
  scale: number;
  shapeAtLeast: number;
  shapeAtMost: number;
  failures: number;
};

/** Half the quantile 0.90 of chi-square with one degree of freedom: 2.705543 / 2. */
const RATIO = 1.3527717;
const SHAPES = { least: 0.01, most: 200 };

/**
 * Weibull by maximum likelihood with censoring (NIST/SEMATECH e-Handbook 8.4.1.2; W. Q. Meeker and L. A. Escobar,
 * Statistical Methods for Reliability Data, 1998, chapter 8). Null with fewer than two different hours of failure:
 * one tells no shape.
 */
export function fitWeibull(lives: readonly Life[]): WeibullFit | null {
  checkLives(lives);
  const failed = lives.filter((life) => life.failed);
  if (new Set(failed.map(({ hours }) => hours)).size < 2) return null;
  const longest = Math.max(...lives.map(({ hours }) => hours));
  const logs = lives.map(({ hours }) => Math.log(hours / longest));
  const failures = failed.length;
  const sumOfLogs = logs.reduce((sum, log, index) => sum + (lives[index]!.failed ? log : 0), 0);
  const powers = (shape: number) => {
    const [sum, weighted] = logs.reduce(
      ([all, slope], log) => [all + Math.exp(shape * log), slope + log * Math.exp(shape * log)],
      [0, 0] as [number, number],
    );
    return { sum, slope: weighted / sum };
  };
  // The profile likelihood's slope falls all the way through its only zero.
  const slope = (shape: number) => 1 / shape + sumOfLogs / failures - powers(shape).slope;
  const likelihood = (shape: number) =>
    failures * (Math.log(shape) - Math.log(powers(shape).sum)) + shape * sumOfLogs;
  const shape = findZero(slope, SHAPES.least, SHAPES.most);
  const above = (other: number) => likelihood(other) - likelihood(shape) + RATIO;
  return {
    shape,
    scale: longest * (powers(shape).sum / failures) ** (1 / shape),
    shapeAtLeast: findZero((other) => -above(other), SHAPES.least, shape),
    shapeAtMost: findZero(above, shape, SHAPES.most),
    failures,
  };
}

/** Where a falling function is zero, by halving on the scale of ratios; an end where it does not change its sign. */
export function findZero(falling: (x: number) => number, least: number, most: number): number {
  let [low, high] = [least, most];
  for (let round = 0; round < 100 && high / low > 1 + 1e-13; round += 1) {
    const middle = Math.sqrt(low * high);
    if (falling(middle) > 0) low = middle;
    else high = middle;
  }
  return Math.sqrt(low * high);
}

/** Failures per 1,000 operating hours, and the mean operating time between failures, null without a failure. */
export type FailureRate = { failures: number; per1000Hours: number; meanHoursBetween: number | null };

/** From all operating hours of a group and its failures (IEC 60050-192-05-13). Null without an operating hour. */
export function computeFailureRate(failures: number, operatingHours: number): FailureRate | null {
  if (!(operatingHours > 0)) return null;
  return {
    failures,
    per1000Hours: (1000 * failures) / operatingHours,
    meanHoursBetween: failures > 0 ? operatingHours / failures : null,
  };
}
