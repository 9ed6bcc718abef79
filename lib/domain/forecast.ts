/**
 * What units will run: hours a day (or outings), pooled by dock and kind of model.
 *
 * `computePool` learns from the units of a pool, `forecastUnit` says what one of them will have run by each day to
 * come, and how sure that is; `forecast-passage.ts` makes days of due points of it. One measure at a time.
 */
import type { DailyUsage } from './usage';
import { numberOfDay } from './calendar-day';
import { computeBetween, computeLevel, computeRecord, type Level, type OwnRecord } from './forecast-level';
import { computeDoubt, computeRhythm, type PoolDay, rateOn, type Rhythm } from './forecast-rhythm';

/** One unit's amounts day by day: tenths of an hour, or outings; days that are not open count for nothing. */
export type UnitDays = { unitId: string; from: number; amounts: readonly number[]; open: readonly boolean[] };

export type Pool = {
  rhythm: Rhythm;
  levels: Map<string, Level & { ownDays: number }>;
  /** Variance of a unit's day over its mean, likeness of days in a row included. */
  within: number;
  between: number;
  units: number;
  /** Worked out already, by day number: every unit of the pool asks for the same ones. */
  rates: Map<number, number>;
};

/**
 * What is expected of a unit on each day from `from` on: `sums` is what it will have run by the end of the day, and
 * `doubts` the relative variance of that. `basis` is what it rests on: `unit` its own record and its pool's, `pool`
 * its pool's alone, a guess to be shown as such.
 */
export type UsageForecast = {
  from: number;
  basis: 'unit' | 'pool';
  sums: Float64Array;
  doubts: Float64Array;
};

/** A unit with fewer open days of its own than these rests on its pool. */
const FEWEST_OWN_DAYS = 7;

/**
 * What a model leaves out also happens. On simulated fleets, whose weather lasts for weeks and whose growth is not
 * steady, ranges hold eight of ten at this multiple of the variance (one and a half times the standard deviation).
 */
const UNFORESEEN = 2.25;

/** The days of one measure of a unit's usage, as `computePool` takes them. */
export function toUnitDays(unitId: string, usage: DailyUsage, measure: 'tenths' | 'outings'): UnitDays {
  return { unitId, from: numberOfDay(usage.from), amounts: usage[measure], open: usage.open };
}

/** What a pool's units teach together, or null when they ran nothing or on fewer than 14 days. */
export function computePool(units: readonly UnitDays[]): Pool | null {
  const rhythm = computeRhythm(sumDays(units));
  if (!rhythm) return null;
  const rates = new Map<number, number>();
  const records = units.map((unit) => {
    const expected = unit.amounts.map((_, index) => rateOf(rhythm, rates, unit.from + index));
    return { unit, expected, record: computeRecord(unit.amounts, expected, unit.open) };
  });
  const within = computeWithin(records) * rhythm.memory;
  const between = computeBetween(
    records.map(({ record }) => record),
    within,
  );
  const levels = records.map(({ unit, record }) => {
    const ownDays = unit.open.filter(Boolean).length;
    return [unit.unitId, { ...computeLevel(record, within, between, units.length), ownDays }] as const;
  });
  return { rhythm, levels: new Map(levels), within, between, units: units.length, rates };
}

function rateOf(rhythm: Rhythm, rates: Map<number, number>, day: number): number {
  let rate = rates.get(day);
  if (rate === undefined) rates.set(day, (rate = rateOn(rhythm, day)));
  return rate;
}

function sumDays(units: readonly UnitDays[]): PoolDay[] {
  const days = new Map<number, PoolDay>();
  for (const { from, amounts, open } of units) {
    amounts.forEach((amount, index) => {
      if (!open[index]) return;
      const day = days.get(from + index);
      if (day) {
        day.units += 1;
        day.amount += amount;
      } else days.set(from + index, { day: from + index, units: 1, amount });
    });
  }
  return [...days.values()].sort((a, b) => a.day - b.day);
}

/** Pearson's dispersion of units' days about their pool's rhythm times how busy each was. */
function computeWithin(
  records: readonly { unit: UnitDays; expected: number[]; record: OwnRecord }[],
): number {
  let [sum, count] = [0, 0];
  for (const { unit, expected, record } of records) {
    const factor = record.expected > 0 ? record.ran / record.expected : 0;
    if (factor <= 0) continue;
    unit.amounts.forEach((amount, index) => {
      const mean = expected[index]! * factor;
      if (!unit.open[index] || mean < 1e-9) return;
      sum += (amount - mean) ** 2 / mean;
      count += 1;
    });
  }
  return Math.max(sum / Math.max(1, count), 1e-9);
}

/**
 * What a unit will run from day number `from` on, `open[i]` being whether it can be hired on day `from + i`: shut
 * days, lay-ups and time out of season are false and run nothing. The unit need not have been in the pool.
 */
export function forecastUnit(
  pool: Pool,
  unitId: string,
  from: number,
  open: readonly boolean[],
): UsageForecast {
  const own = pool.levels.get(unitId);
  const level = own ?? computeLevel({ ran: 0, expected: 0 }, pool.within, pool.between, pool.units + 1);
  const doubts = poolDoubts(pool, from, open);
  const sums = new Float64Array(open.length);
  let sum = 0;
  open.forEach((isOpen, ahead) => {
    if (isOpen) sum += rateOf(pool.rhythm, pool.rates, from + ahead) * level.factor;
    sums[ahead] = sum;
    const own = sum > 0 ? level.variance / level.factor ** 2 + pool.within / sum : 0;
    doubts[ahead] = UNFORESEEN * (doubts[ahead]! + own);
  });
  return { from, basis: (own?.ownDays ?? 0) >= FEWEST_OWN_DAYS ? 'unit' : 'pool', sums, doubts };
}

/** Doubts of the same days that were worked out already: most units of a pool have the same days ahead. */
const known = new WeakMap<Pool, { key: string; doubts: Float64Array }>();

function poolDoubts(pool: Pool, from: number, open: readonly boolean[]): Float64Array {
  const key = `${from} ${open.map(Number).join('')}`;
  const kept = known.get(pool);
  if (kept?.key === key) return Float64Array.from(kept.doubts);
  const days = open.map((isOpen, ahead) => ({
    day: from + ahead,
    rate: isOpen ? rateOf(pool.rhythm, pool.rates, from + ahead) : 0,
  }));
  const doubts = computeDoubt(pool.rhythm, days);
  known.set(pool, { key, doubts });
  return Float64Array.from(doubts);
}
