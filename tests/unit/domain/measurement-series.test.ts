import { expect, test } from 'vitest';
import { toKept } from '@/lib/domain/measured-value';
import { computeSeries, describeTrend, type Measured } from '@/lib/domain/measurement-series';

const SPECS = {
  Compression: { min: 110, unit: 'psi' },
  'Low-speed screw': { min: 1, max: 1.5, unit: 'turns' },
};
const psi = (place: number, hours: number, value: number, stage: 'found' | 'left' = 'found'): Measured => ({
  spec: 'Compression',
  place,
  stage,
  runs: [{ typed: String(value), unit: 'psi', value: toKept(value, 'psi') }],
  engineHoursTenths: hours * 10,
  taskId: `task at ${hours}`,
});

test('each quantity is drawn place by place in the order of engine hours, with its limits', () => {
  const [series, ...others] = computeSeries([psi(2, 100, 140), psi(1, 50, 141), psi(1, 20, 142)], SPECS);
  expect(others).toEqual([]);
  expect(series).toMatchObject({ spec: 'Compression', unit: 'psi' });
  // 110 psi in pascals: 110 × 6894.757293168.
  expect(series!.limits?.min).toBeCloseTo(758_423.30224848, 6);
  expect(series!.places.map(({ place, points }) => [place, points.map((p) => p.engineHoursTenths)])).toEqual([
    [1, [200, 500]],
    [2, [1000]],
  ]);
});

// A line that falls 0.1 psi an hour from 130 psi at 0 h is at 112 psi at 180 h: 20 h from 110 psi. Worked by hand.
test('a steady fall says how many hours are left; work in between, as left, does not hide it', () => {
  const fall = [20, 60, 100, 140, 180].map((hours) => psi(1, hours, 130 - 0.1 * hours));
  const [series] = computeSeries([...fall, psi(1, 100, 150, 'left')], SPECS);
  const { trend } = series!.places[0]!;
  expect(trend).toEqual({ towards: 'min', leftTenths: 200 });
  expect(describeTrend(trend!)).toBe('Drifting towards the lower limit, about 20 h left.');
});

test('too few points, or none that drift, say nothing', () => {
  const flat = [20, 60, 100, 140, 180].map((hours, index) => psi(1, hours, index % 2 ? 140 : 141));
  expect(computeSeries(flat, SPECS)[0]!.places[0]!.trend).toBeNull();
  const few = [20, 60].map((hours) => psi(1, hours, 130 - hours / 10));
  expect(computeSeries(few, SPECS)[0]!.places[0]!.trend).toBeNull();
  expect(computeSeries(flat, {})[0]).toMatchObject({ limits: null, unit: 'psi' });
});
