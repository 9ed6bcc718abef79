import { describe, expect, test } from 'vitest';
import { fromKept, parseMeasured, toKept, type MeasuredUnit } from '@/lib/domain/measured-value';
import { judgePlaces, judgeRuns, toLimits, type Spec } from '@/lib/domain/measurement';
import { computeTrend } from '@/lib/domain/trend';

const run = (text: string, unit: MeasuredUnit) => {
  const parsed = parseMeasured(text, unit);
  if ('fault' in parsed) throw new Error(parsed.fault);
  return parsed;
};
const judge = (spec: Spec, unit: MeasuredUnit, ...texts: string[]) =>
  judgeRuns(
    texts.map((text) => run(text, unit)),
    toLimits(spec, unit),
  ).verdict;

describe('units of measure', () => {
  test('1 psi is 6894.757293168 Pa: pound-force over square inch, both exact; NIST SP 811 rounds to 6.894757E+03', () => {
    const poundForce = 0.45359237 * 9.80665;
    expect(toKept(1, 'psi')).toBeCloseTo(poundForce / 0.0254 ** 2, 8);
    expect(toKept(1, 'psi').toPrecision(7)).toBe('6894.757');
  });

  test('1 lb·ft is 1.355818 N·m, and 1 in is 25.4 mm exactly (NIST SP 811, appendix B.8)', () => {
    expect(toKept(1, 'lb·ft').toPrecision(7)).toBe('1.355818');
    expect(toKept(1, 'in')).toBe(25.4);
  });

  test('1 bar is 100 kPa (SI brochure, table 8)', () => {
    expect(fromKept(toKept(1, 'bar'), 'kPa')).toBe(100);
  });
});

// Common practice among those who rebuild diaphragm carburettors; no published source.
describe('common practice, no published source', () => {
  const popOff: Spec = { min: 21, max: 37, unit: 'psi', repeats: 2, maxSpread: { amount: 1, of: 'unit' } };

  test('pop-off from 21 to 37 psi: runs of 25 and 25 pass', () => {
    expect(judge(popOff, 'psi', '25', '25')).toBe('in');
  });

  test('the limits belong to what is allowed', () => {
    expect(judge(popOff, 'psi', '21', '21')).toBe('in');
    expect(judge(popOff, 'psi', '37', '37')).toBe('in');
    expect(judge(popOff, 'kPa', '144.8', '144.8')).toBe('in');
    expect(judge(popOff, 'psi', '20.9', '21')).toBe('out');
    expect(judge(popOff, 'psi', '37', '37.1')).toBe('out');
  });

  test('all runs must agree, and one run is not enough', () => {
    expect(judge(popOff, 'psi', '25', '29')).toBe('repeats_disagree');
    expect(judge(popOff, 'psi', '25')).toBe('too_few_repeats');
  });

  test('a low-speed screw at 1¼ turns, a high-speed screw lightly seated at 0, either within ¼ turn on the water', () => {
    const lowSpeed: Spec = { min: 1, max: 1.5, target: 1.25, unit: 'turns' };
    expect(['1 1/4', '1', '1½', '1.25'].map((text) => judge(lowSpeed, 'turns', text))).toEqual(
      Array(4).fill('in'),
    );
    expect(['7/8', '1 5/8'].map((text) => judge(lowSpeed, 'turns', text))).toEqual(['out', 'out']);
    const highSpeed: Spec = { min: 0, max: 0.25, target: 0, unit: 'turns' };
    expect(['0', '¼', '⅜'].map((text) => judge(highSpeed, 'turns', text))).toEqual(['in', 'in', 'out']);
  });

  test('compression between cylinders within 10 %, or within the 15 % of another maker: it is a spec', () => {
    const across = (percent: number, ...psi: string[]) =>
      [
        ...judgePlaces(
          psi.map((text, index) => ({ place: index + 1, runs: [run(text, 'psi')] })),
          toLimits({ min: 100, unit: 'psi', maxDifference: { amount: percent, of: 'percent' } }, 'psi'),
        ).values(),
      ].map(({ verdict }) => verdict);
    expect(across(10, '150', '135')).toEqual(['in', 'in']);
    expect(across(10, '150', '134')).toEqual(['places_differ', 'places_differ']);
    expect(across(15, '150', '134')).toEqual(['in', 'in']);
    expect(across(15, '150', '127')).toEqual(['places_differ', 'places_differ']);
    expect(across(10, '150', '149', '99')).toEqual(['in', 'in', 'out']);
  });
});

test('a line through the first data set of Anscombe (1973): y = 3.00 + 0.500 x, so 14 is reached at 22', () => {
  // Graphs in Statistical Analysis, The American Statistician 27, 17-21; slope 0.500, its standard error 0.118.
  const x = [10, 8, 13, 9, 11, 14, 6, 4, 12, 7, 5];
  const y = [8.04, 6.95, 7.58, 8.81, 8.33, 9.96, 7.24, 4.26, 10.84, 4.82, 5.68];
  const points = x.map((hours, index) => ({ engineHoursTenths: hours * 10, value: y[index]! }));
  const trend = computeTrend(points, { min: null, max: 14 });
  expect(trend?.towards).toBe('max');
  expect(Math.abs(trend!.leftTenths - 80)).toBeLessThanOrEqual(1);
});
