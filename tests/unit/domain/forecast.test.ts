import { describe, expect, test } from 'vitest';
import { dayOfNumber, numberOfDay, WEEKDAYS } from '@/lib/domain/calendar-day';
import { computePool, forecastUnit, type Pool, toUnitDays, type UnitDays } from '@/lib/domain/forecast';
import { computeChances, computePassage } from '@/lib/domain/forecast-passage';
import { computeDailyUsage, computeOpenDays } from '@/lib/domain/usage';
import { dice } from '../../support/simulated-hires';

const FROM = numberOfDay('2025-01-06'); // a Monday
const always = (days: number) => Array<boolean>(days).fill(true);

/** A unit that is hired on about half of its days, for about `tenths` then. */
function unit(unitId: string, days: number, tenths: number, seed: number): UnitDays {
  const { uniform } = dice(seed);
  const amounts = Array.from({ length: days }, () =>
    uniform() < 0.5 ? Math.round(tenths * (0.6 + 0.8 * uniform())) : 0,
  );
  return { unitId, from: FROM, amounts, open: always(days) };
}
const steady = (days: number, tenths: number): UnitDays => ({
  unitId: 'steady',
  from: FROM,
  amounts: Array<number>(days).fill(tenths),
  open: always(days),
});
const mustPool = (units: UnitDays[]): Pool => {
  const pool = computePool(units);
  if (!pool) throw new Error('no pool');
  return pool;
};
/** Tenths a day over the next four weeks. */
const pace = (pool: Pool, unitId: string, from = FROM + 200) =>
  forecastUnit(pool, unitId, from, always(28)).sums.at(-1)! / 28;

describe('what a unit will run', () => {
  test('is unknown where nothing ran, or for less than two weeks', () => {
    expect(computePool([])).toBeNull();
    expect(computePool([steady(100, 0)])).toBeNull();
    expect(computePool([steady(13, 20)])).toBeNull();
    expect(computePool([steady(14, 20)])).not.toBeNull();
  });

  test('goes on as it went: 20 tenths every day come to 100 on the fifth', () => {
    const forecast = forecastUnit(mustPool([steady(200, 20)]), 'steady', FROM + 200, always(60));
    expect(forecast.sums[4]).toBeCloseTo(100, 0);
    const passage = computePassage(forecast, 99.9);
    expect(passage).toMatchObject({ expectedOn: dayOfNumber(FROM + 204), isGuess: false });
  });

  test('a new unit borrows the pace of its pool, and is a guess; a busy one speaks for itself', () => {
    const units = [1, 2, 3, 4, 5, 6].map((seed) => unit(`u${seed}`, 200, 40, seed));
    const pool = mustPool([...units, unit('busy', 200, 120, 7)]);
    const [usual, busy, fresh] = [pace(pool, 'u1'), pace(pool, 'busy'), pace(pool, 'new')];
    expect(busy).toBeGreaterThan(2 * usual);
    expect(fresh).toBeGreaterThan(usual);
    expect(fresh).toBeLessThan(busy);
    const guess = forecastUnit(pool, 'new', FROM + 200, always(60));
    const known = forecastUnit(pool, 'u1', FROM + 200, always(60));
    expect([guess.basis, known.basis]).toEqual(['pool', 'unit']);
    expect(guess.doubts[30]).toBeGreaterThan(known.doubts[30]!);
    expect(computePassage(guess, 500).isGuess).toBe(true);
  });

  test('recent weeks weigh more than old ones', () => {
    const then = unit('a', 200, 80, 1);
    const now = { ...then, amounts: then.amounts.map((tenths, day) => (day < 140 ? tenths : tenths / 4)) };
    const whole = now.amounts.reduce((sum, tenths) => sum + tenths, 0) / 200;
    expect(pace(mustPool([now]), 'a')).toBeLessThan(0.6 * whole);
  });

  test('follows the weekday: what ran on Saturdays alone is due on a Saturday', () => {
    const saturdays = steady(200, 0);
    saturdays.amounts = saturdays.amounts.map((_, day) => (day % 7 === 5 ? 60 : 0));
    const forecast = forecastUnit(mustPool([saturdays]), 'steady', FROM + 203, always(60));
    const { expectedOn } = computePassage(forecast, 150);
    expect((numberOfDay(expectedOn!) - FROM) % 7).toBe(5);
  });

  test('stands still out of season and in a lay-up', () => {
    const pool = mustPool([steady(200, 20)]);
    const opening = { season: { from: '04-01', to: '10-31' }, openWeekdays: WEEKDAYS };
    const from = numberOfDay('2025-10-30');
    const open = computeOpenDays({ opening, layUps: [{ from: '2026-04-01', to: '2026-04-10' }] }, from, 365);
    const { sums } = forecastUnit(pool, 'steady', from, open);
    expect(sums[1]).toBeGreaterThan(0);
    expect(sums[numberOfDay('2026-04-10') - from]).toBe(sums[1]);
    expect(sums[numberOfDay('2026-04-11') - from]).toBeGreaterThan(sums[1]!);
  });

  test('a due point beyond the forecast has no day, and one that is reached has the first', () => {
    const forecast = forecastUnit(mustPool([steady(200, 20)]), 'steady', FROM + 200, always(30));
    expect(computePassage(forecast, 10_000)).toMatchObject({
      earliestOn: null,
      expectedOn: null,
      latestOn: null,
    });
    const first = dayOfNumber(FROM + 200);
    expect(computePassage(forecast, 0)).toMatchObject({
      earliestOn: first,
      expectedOn: first,
      latestOn: first,
    });
  });

  test('the range lies around what is expected, and widens with what is left', () => {
    const forecast = forecastUnit(mustPool([unit('a', 300, 40, 3)]), 'a', FROM + 300, always(400));
    const width = (left: number) => {
      const { earliestOn, expectedOn, latestOn } = computePassage(forecast, left);
      expect(earliestOn! <= expectedOn! && expectedOn! <= latestOn!).toBe(true);
      return numberOfDay(latestOn!) - numberOfDay(earliestOn!);
    };
    expect(width(200)).toBeLessThan(width(1000));
  });

  test('the chance to have come to a due point grows day by day, and is a tenth where the range begins', () => {
    const forecast = forecastUnit(mustPool([unit('a', 300, 40, 3)]), 'a', FROM + 300, always(400));
    const { earliestOn, expectedOn, latestOn } = computePassage(forecast, 600);
    const chances = computeChances(forecast, 600);
    const at = (day: string | null) => numberOfDay(day!) - forecast.from;
    for (const [day, bar] of [
      [at(earliestOn), 0.1],
      [at(expectedOn), 0.5],
      [at(latestOn), 0.9],
    ] as const) {
      expect(chances[day]).toBeGreaterThanOrEqual(bar);
      expect(chances[day - 1]).toBeLessThan(bar);
    }
    chances.forEach((chance, day) => expect(chance).toBeGreaterThanOrEqual(chances[day - 1] ?? 0));
    expect(computeChances(forecast, 0)[0]).toBe(1);
  });

  test('counts outings by the same rules', () => {
    const usage = computeDailyUsage({
      readings: [{ on: '2025-01-06', engineHoursTenths: 0 }],
      outings: Array.from({ length: 60 }, (_, index) => dayOfNumber(FROM + index)),
      layUps: [],
      opening: { season: null, openWeekdays: WEEKDAYS },
      today: dayOfNumber(FROM + 60),
    })!;
    const pool = mustPool([toUnitDays('a', usage, 'outings')]);
    const forecast = forecastUnit(pool, 'a', FROM + 60, always(60));
    expect(forecast.sums[9]).toBeCloseTo(10, 1);
  });
});
