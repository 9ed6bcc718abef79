import fc from 'fast-check';
import { expect, test } from 'vitest';
import { computeTrend } from '@/lib/domain/trend';

const at = (...values: number[]) => values.map((value, index) => ({ engineHoursTenths: index * 250, value }));

test('a falling pressure says towards which limit it drifts, and for how many hours it lasts', () => {
  // 2 a measurement every 25 h, worked by hand: from 30 to 22 over 100 h, and 21 is 12.5 h further on.
  expect(computeTrend(at(30, 28, 26, 24, 22), { min: 21, max: 37 })).toEqual({
    towards: 'min',
    leftTenths: 125,
  });
  expect(computeTrend(at(30, 28, 26, 24, 20), { min: 21, max: 37 })).toEqual({
    towards: 'min',
    leftTenths: 0,
  });
});

test.each([
  ['there are four measurements', at(30, 28, 26, 24), { min: 21, max: 37 }],
  ['it wanders without drifting', at(30, 27, 31, 26, 30, 28), { min: 21, max: 37 }],
  ['it does not move', at(30, 30, 30, 30, 30), { min: 21, max: 37 }],
  ['it drifts where there is no limit', at(30, 28, 26, 24, 22), { min: null, max: 37 }],
  ['the limit is far away', at(30, 29.9, 29.8, 29.7, 29.6), { min: 21, max: 37 }],
  [
    'all were taken at the same hours',
    at(30, 28, 26, 24, 22).map((p) => ({ ...p, engineHoursTenths: 100 })),
    { min: 21, max: 37 },
  ],
])('says nothing when %s', (_, points, limits) => {
  expect(computeTrend(points, limits)).toBeNull();
});

test('the order in which measurements are listed does not matter', () => {
  const points = at(30, 28.2, 26.1, 24, 22.3, 20.9);
  fc.assert(
    fc.property(fc.shuffledSubarray(points, { minLength: points.length }), (shuffled) => {
      expect(computeTrend(shuffled, { min: 15, max: 37 })).toEqual(
        computeTrend(points, { min: 15, max: 37 }),
      );
    }),
  );
});
