/**
 * How busy each unit is against its pool: a factor, 1 for as busy as the rest.
 *
 * Credibility: a unit's own record counts the more, the more there is of it, and the rest is borrowed from the pool
 * (H. Bühlmann and E. Straub, Glaubwürdigkeit für Schadensätze, 1970; the estimator of the variance between units is
 * theirs). A new unit is as busy as its pool; a busy one speaks for itself.
 */

/** What a unit ran and what the rhythm of its pool expected of it, recent days weighing more. */
export type OwnRecord = { ran: number; expected: number };
/** A unit's factor, and its variance. */
export type Level = { factor: number; variance: number };

/** Half the weight is of the last so many open days. */
const HALF_LIFE_OPEN_DAYS = 60;
/** The variance between units where fewer than three of them can be compared, and its bounds where they can. */
const USUAL_BETWEEN = 0.09;
const BETWEEN = { least: 0.0025, most: 1 };

/** Adds up the days of a unit in order, `rates` being what its pool's rhythm expects of an open day. */
export function computeRecord(
  amounts: readonly number[],
  rates: readonly number[],
  open: readonly boolean[],
): OwnRecord {
  const fade = 0.5 ** (1 / HALF_LIFE_OPEN_DAYS);
  let [ran, expected] = [0, 0];
  open.forEach((isOpen, index) => {
    if (!isOpen) return;
    ran = ran * fade + amounts[index]!;
    expected = expected * fade + rates[index]!;
  });
  return { ran, expected };
}

/**
 * The variance between the factors of units: what their ratios differ by beyond what `within`, the variance of a
 * unit's amount over its mean, explains. Bühlmann and Straub's unbiased estimator, kept within bounds.
 */
export function computeBetween(records: readonly OwnRecord[], within: number): number {
  const known = records.filter(({ expected }) => expected > 0);
  const total = known.reduce((sum, { expected }) => sum + expected, 0);
  const weights = total - known.reduce((sum, { expected }) => sum + expected ** 2, 0) / (total || 1);
  if (known.length < 3 || weights <= 0) return USUAL_BETWEEN;
  const mean = known.reduce((sum, { ran }) => sum + ran, 0) / total;
  const spread = known.reduce((sum, { ran, expected }) => sum + expected * (ran / expected - mean) ** 2, 0);
  const between = (spread - (known.length - 1) * within) / weights;
  return Math.min(BETWEEN.most, Math.max(BETWEEN.least, between));
}

/**
 * A unit's factor: (ran + k) / (expected + k) with k = within / between. In a pool of one unit the pool's level is
 * the unit's own, so it is 1 and sure; of n units the share 1 − 1/n is its own.
 */
export function computeLevel(record: OwnRecord, within: number, between: number, unitsInPool: number): Level {
  if (unitsInPool <= 1) return { factor: 1, variance: 0 };
  const borrowed = within / between;
  const factor = (record.ran + borrowed) / (record.expected + borrowed);
  return { factor, variance: (factor * within * (1 - 1 / unitsInPool)) / (record.expected + borrowed) };
}
