import { describe, expect, test } from 'vitest';
import { computeOutlook, computeWanted, findReliefs, type OutlookUnit } from '@/lib/domain/outlook';

const duty = (
  dutyId: string,
  chanceBy: number[],
  planned: { first: number; last: number } | null = null,
) => ({
  dutyId,
  chanceBy,
  planned,
});
const unit = (unitId: string, over: Partial<OutlookUnit> = {}): OutlookUnit => ({
  unitId,
  heldUntil: 0,
  duties: [],
  ...over,
});
const days = (count: number, wanted = 1) => Array<number>(count).fill(wanted);

// Worked by hand.
describe('how many units will be ready', () => {
  test('all of them while nothing holds', () => {
    const [today] = computeOutlook([unit('a'), unit('b')], [2]);
    expect(today).toMatchObject({
      expected: 2,
      least: 2,
      most: 2,
      chanceShort: 0,
      isShort: false,
      causes: [],
    });
  });

  test('a unit held by a defect is missing until it is released', () => {
    expect(computeOutlook([unit('a', { heldUntil: 2 })], days(3)).map((day) => day.expected)).toEqual([
      0, 0, 1,
    ]);
    expect(computeOutlook([unit('a', { heldUntil: Infinity })], days(2)).map((day) => day.expected)).toEqual([
      0, 0,
    ]);
  });

  test('a duty takes its unit as it comes due, and a plan for it gives it back', () => {
    const chances = [0, 0.2, 0.9, 1, 1];
    const late = computeOutlook([unit('a', { duties: [duty('d', chances)] })], days(5));
    expect(late.map(({ expected }) => Number(expected.toFixed(3)))).toEqual([1, 0.8, 0.1, 0, 0]);
    const planned = unit('a', { duties: [duty('d', chances, { first: 1, last: 2 })] });
    expect(computeOutlook([planned], days(5)).map(({ expected }) => expected)).toEqual([1, 0, 0, 1, 1]);
  });

  test('two duties of a unit hold it together: 0.5 and 0.5 leave a quarter', () => {
    const [today] = computeOutlook([unit('a', { duties: [duty('x', [0.5]), duty('y', [0.5])] })], [1]);
    expect(today!.expected).toBeCloseTo(0.25, 12);
  });

  test('a day is short when fewer are expected than wanted, and says which duties do it, the worst first', () => {
    const fleet = [
      unit('a', { duties: [duty('likely', [0.9])] }),
      unit('b', { duties: [duty('maybe', [0.3])] }),
      unit('c', { duties: [duty('hardly', [0.01])] }),
      unit('d', { heldUntil: 9, duties: [duty('held anyway', [1])] }),
    ];
    const [today] = computeOutlook(fleet, [3]);
    expect(today!.isShort).toBe(true);
    expect(today!.causes.map(({ dutyId }) => dutyId)).toEqual(['likely', 'maybe']);
    expect(today!.causes[0]!.units).toBeCloseTo(0.9, 12);
  });

  test('nothing is short where nothing is wanted', () => {
    const [today] = computeOutlook([unit('a', { heldUntil: 5 })], [0]);
    expect(today).toMatchObject({ isShort: false, chanceShort: 0 });
  });
});

/** The chance that fewer than `wanted` of independent units are ready, by adding up every outcome. */
function chanceBelow(wanted: number, chances: readonly number[]): number {
  let total = 0;
  for (let outcome = 0; outcome < 2 ** chances.length; outcome += 1) {
    const ready = chances.map((_, index) => Math.floor(outcome / 2 ** index) % 2 === 1);
    const chance = chances.reduce((product, p, index) => product * (ready[index] ? p : 1 - p), 1);
    if (ready.filter(Boolean).length < wanted) total += chance;
  }
  return total;
}

test('the chance to be short is near the sum over all outcomes, within 0.03', () => {
  const held = [0.1, 0.2, 0.3, 0.5, 0.5, 0.6, 0.05, 0.4, 0.25, 0.15];
  const fleet = held.map((chance, index) => unit(`${index}`, { duties: [duty(`d${index}`, [chance])] }));
  for (const wanted of [5, 6, 7, 8, 9]) {
    const [today] = computeOutlook(fleet, [wanted]);
    const exact = chanceBelow(
      wanted,
      held.map((chance) => 1 - chance),
    );
    expect(Math.abs(today!.chanceShort - exact)).toBeLessThan(0.03);
  }
});

test('what is usually wanted is what served four of five such days', () => {
  const saturdays = [4, 7, 5, 6, 9].map((out, week) => ({ weekday: 5, dayOfYear: 180 + 7 * week, out }));
  const others = [
    { weekday: 0, dayOfYear: 190, out: 20 },
    { weekday: 5, dayOfYear: 20, out: 30 },
  ];
  expect(computeWanted([...saturdays, ...others], 5, 194)).toBe(7);
  expect(computeWanted(others, 5, 194)).toBeNull();
  // The year's end and its beginning are one season.
  const winter = [355, 362, 3, 10].map((dayOfYear) => ({ weekday: 5, dayOfYear, out: 1 }));
  expect(computeWanted(winter, 5, 365)).toBe(1);
});

test('what to do before a short day: the duty that gives its unit back on most of them first', () => {
  const fleet = [
    unit('a', { duties: [duty('soon', [0, 1, 1, 1])] }),
    unit('b', { duties: [duty('then', [0, 0, 0, 1])] }),
    unit('c', { duties: [duty('planned', [1, 1, 1, 1], { first: 3, last: 3 })] }),
  ];
  expect(findReliefs(fleet, computeOutlook(fleet, days(4, 3)))).toEqual([
    { dutyId: 'soon', unitId: 'a', doBefore: 1, shortDays: 3 },
    { dutyId: 'then', unitId: 'b', doBefore: 3, shortDays: 1 },
  ]);
});
