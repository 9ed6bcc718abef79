/**
 * The rhythm of a pool (the units of one kind at one dock): how much one unit runs on an open day, by weekday,
 * season and the level of the last weeks.
 */
import { factorise, solveLower, solveWith, type Symmetric } from './cholesky';
import { chooseTerms, penaltyOf, type Row, rowOf, type Terms } from './forecast-terms';

/** One day of a pool: how many units could be hired, and what they ran together (or how many outings they made). */
export type PoolDay = { day: number; units: number; amount: number };

export type Rhythm = {
  terms: Terms;
  coefficients: Float64Array;
  /** Of the penalised information matrix: what the coefficients are unsure by. */
  factor: Symmetric;
  /** Variance of a pool's day over its mean. */
  dispersion: number;
  /** By how much the variance of a sum of many days exceeds that of as many days without memory. */
  memory: number;
};

/** Fewer days than two weeks say nothing about weekdays. */
const FEWEST_DAYS = 14;
const MOST_ROUNDS = 40;
const CLOSE_ENOUGH = 1e-6;
/** Rounds after which the dispersion is taken as settled, so that the rest converges. */
const ROUNDS_OF_DISPERSION = 6;
const MEMORY_DAYS = 28;

type Fit = { rows: Row[]; days: readonly PoolDay[]; penalty: Symmetric };

/**
 * Fits the rhythm to the days of a pool, in order; days without a unit are left out. Null with fewer than 14 of
 * them, or when nothing ran at all.
 *
 * A penalised log-linear model by quasi-likelihood, its variance proportional to its mean, which days without usage
 * do not upset (P. McCullagh and J. A. Nelder, Generalized Linear Models, 1989, chapters 6 and 9), solved by
 * penalised iteratively re-weighted least squares (S. N. Wood, Generalized Additive Models, 2017, 3.4). The level is
 * a random walk, so recent weeks decide where it stands; season and growth are told apart from it by fitting all
 * together. Before a pool has seen a year there is no season, and the level follows faster. What the terms are
 * expected to amount to was settled on simulated fleets, not on the data that the forecast is checked with.
 */
export function computeRhythm(poolDays: readonly PoolDay[]): Rhythm | null {
  const days = poolDays.filter(({ units }) => units > 0);
  const [first, last] = [days[0], days.at(-1)];
  const total = days.reduce((sum, { amount }) => sum + amount, 0);
  if (!first || !last || days.length < FEWEST_DAYS || total <= 0) return null;
  const terms = chooseTerms(first.day, last.day);
  const fit: Fit = { rows: days.map(({ day }) => rowOf(terms, day)), days, penalty: penaltyOf(terms) };
  const start = Math.log(total / days.reduce((sum, { units }) => sum + units, 0));
  const coefficients = new Float64Array(terms.size).fill(start, terms.firstLevel);
  let [dispersion, memory] = [Math.max(total / days.length, 1e-9), 1];
  let factor = factorise(fit.penalty);
  for (let round = 0; round < MOST_ROUNDS; round += 1) {
    const means = meansOf(fit, coefficients);
    if (round > 0 && round <= ROUNDS_OF_DISPERSION) {
      ({ dispersion, memory } = dispersionOf(days, means));
    }
    const step = stepOf(fit, coefficients, means, dispersion * memory);
    factor = step.factor;
    const largest = step.change.reduce((most, change) => Math.max(most, Math.abs(change)), 0);
    step.change.forEach((change, place) => {
      coefficients[place]! += largest > 1 ? change / largest : change;
    });
    if (largest < CLOSE_ENOUGH && round > ROUNDS_OF_DISPERSION) break;
  }
  return { terms, coefficients, factor, dispersion, memory };
}

const dot = ({ places, values }: Row, coefficients: Float64Array) =>
  places.reduce((sum, place, index) => sum + coefficients[place]! * values[index]!, 0);

const meansOf = ({ rows, days }: Fit, coefficients: Float64Array) =>
  rows.map(
    (row, index) => days[index]!.units * Math.exp(Math.min(30, Math.max(-30, dot(row, coefficients)))),
  );

/** One Newton step: what the coefficients change by, and the factor of the information matrix. */
function stepOf(
  { rows, days, penalty }: Fit,
  coefficients: Float64Array,
  means: readonly number[],
  scale: number,
): { change: Float64Array; factor: Symmetric } {
  const information = penalty.map((row) => Float64Array.from(row));
  const gradient = penalised(penalty, coefficients);
  rows.forEach(({ places, values }, index) => {
    const weight = means[index]! / scale;
    const rest = (days[index]!.amount - means[index]!) / scale;
    places.forEach((place, i) => {
      gradient[place]! += values[i]! * rest;
      places.forEach((other, j) => {
        if (other <= place) information[place]![other]! += weight * values[i]! * values[j]!;
      });
    });
  });
  const factor = factorise(information);
  return { change: solveWith(factor, gradient), factor };
}

/** Minus the penalty's pull on each coefficient. */
function penalised(penalty: Symmetric, coefficients: Float64Array): Float64Array {
  const pull = new Float64Array(coefficients.length);
  penalty.forEach((row, i) => {
    for (let j = 0; j <= i; j += 1) {
      pull[i]! -= row[j]! * coefficients[j]!;
      if (j < i) pull[j]! -= row[j]! * coefficients[i]!;
    }
  });
  return pull;
}

/**
 * Pearson's dispersion, and how much the days' likeness to those before adds to the variance of their sum: one plus
 * twice the autocorrelations to 28 days, weighted by W. K. Newey and K. D. West (1987), at least 1.
 */
function dispersionOf(
  days: readonly PoolDay[],
  means: readonly number[],
): { dispersion: number; memory: number } {
  const rests = days.map(({ amount }, index) => (amount - means[index]!) / Math.sqrt(means[index]! || 1e-12));
  const variance = rests.reduce((sum, rest) => sum + rest * rest, 0) / rests.length;
  if (variance < 1e-9) return { dispersion: 1e-9, memory: 1 };
  let memory = 1;
  const most = Math.min(MEMORY_DAYS, Math.floor(rests.length / 4));
  for (let lag = 1; lag <= most; lag += 1) {
    let product = 0;
    for (let index = lag; index < rests.length; index += 1) product += rests[index]! * rests[index - lag]!;
    memory += (2 * (1 - lag / (most + 1)) * product) / (rests.length * variance);
  }
  return { dispersion: variance, memory: Math.max(1, memory) };
}

/** What one unit is expected to run on an open day. */
export function rateOn({ terms, coefficients }: Rhythm, day: number): number {
  return Math.exp(dot(rowOf(terms, day), coefficients));
}

/**
 * For each so many days ahead, how unsure the sum of the expected amounts of the open days so far is, as a relative
 * variance: what the coefficients are unsure by, and how far the level may move from here (a random walk).
 */
export function computeDoubt(rhythm: Rhythm, days: readonly { day: number; rate: number }[]): Float64Array {
  const { terms, factor } = rhythm;
  const gradient = new Float64Array(terms.size);
  const walk = terms.levelSpreadPerDay ** 2;
  let [sum, sumOfSums, sumOfSquares] = [0, 0, 0];
  return Float64Array.from(days, ({ day, rate }, ahead) => {
    // A walk's step before day j moves all from j on: Σ_j (S_h − S_j₋₁)², the sums kept as one goes.
    sumOfSums += sum;
    sumOfSquares += sum * sum;
    sum += rate;
    const { places, values } = rowOf(terms, day);
    places.forEach((place, index) => {
      gradient[place]! += rate * values[index]!;
    });
    if (sum <= 0) return 0;
    const known = solveLower(factor, gradient).reduce((total, y) => total + y * y, 0);
    const moved = walk * ((ahead + 1) * sum * sum - 2 * sum * sumOfSums + sumOfSquares);
    return (known + moved) / (sum * sum);
  });
}
