import { describe, expect, test } from 'vitest';
import { adviseInterval, computeCost, computeOptimum } from '@/lib/domain/interval-advice';
import { computeFailureRate, computeSurvival, fitWeibull, type Life } from '@/lib/domain/reliability';

const lives = (failed: readonly number[], running: readonly number[]): Life[] => [
  ...failed.map((hours) => ({ hours, failed: true })),
  ...running.map((hours) => ({ hours, failed: false })),
];

test('Kaplan and Meier by NIST/SEMATECH e-Handbook 8.2.1.5: 20 on test, 6 fail, 4 are removed, 10 outlast 200 h', () => {
  const steps = computeSurvival(
    lives([10, 32, 56, 98, 122, 181], [50, 100, 125, 150, ...Array<number>(10).fill(200)]),
  );
  expect(steps.map(({ hours, atRisk }) => [hours, atRisk])).toEqual([
    [10, 20],
    [32, 19],
    [56, 17],
    [98, 16],
    [122, 14],
    [181, 11],
  ]);
  // The handbook's products: 19/20 × 18/19 × 16/17 × 15/16 × 13/14 × 10/11.
  const survival = [19 / 20, 18 / 20, (18 / 20) * (16 / 17)];
  survival.forEach((share, index) => expect(steps[index]!.survival).toBeCloseTo(share, 12));
  expect(steps.map((step) => Number(step.survival.toFixed(3)))).toEqual([
    0.95, 0.9, 0.847, 0.794, 0.737, 0.67,
  ]);
  // Without censoring before it, Greenwood's error is the binomial one: √(0.95 × 0.05 / 20).
  expect(steps[0]!.error).toBeCloseTo(Math.sqrt((0.95 * 0.05) / 20), 12);
});

// NIST/SEMATECH e-Handbook 8.4.1.2: ten failures, ten outlast 500 h.
const NIST = lives([54, 187, 216, 240, 244, 335, 361, 373, 375, 386], Array<number>(10).fill(500));

describe('Weibull by maximum likelihood', () => {
  test('by NIST/SEMATECH e-Handbook 8.4.1: shape 1.7208, scale 606.5', () => {
    const fit = fitWeibull(NIST)!;
    expect(fit.shape).toBeCloseTo(1.7208, 4);
    expect(fit.scale).toBeCloseTo(606.5, 0);
    expect(fit.scale).toBeCloseTo(606.5276, 3);
  });

  test('its 90 % interval by likelihood ratio is 1.0146 to 2.6735 (worked out with SciPy 1.17)', () => {
    const { shapeAtLeast, shapeAtMost } = fitWeibull(NIST)!;
    expect(shapeAtLeast).toBeCloseTo(1.01465, 4);
    expect(shapeAtMost).toBeCloseTo(2.67345, 4);
  });

  test('one hour of failure tells no shape, and a life lasts some time', () => {
    expect(fitWeibull(lives([100, 100], [200]))).toBeNull();
    expect(fitWeibull(lives([], [200]))).toBeNull();
    expect(() => fitWeibull(lives([100, 0], []))).toThrow(RangeError);
  });
});

test('4 failures in 2,500 operating hours are 1.6 per 1,000 h, 625 h between them; none has no mean (by hand)', () => {
  expect(computeFailureRate(4, 2500)).toEqual({ failures: 4, per1000Hours: 1.6, meanHoursBetween: 625 });
  expect(computeFailureRate(0, 2500)).toMatchObject({ per1000Hours: 0, meanHoursBetween: null });
  expect(computeFailureRate(0, 0)).toBeNull();
});

describe('age replacement', () => {
  const costs = { plannedCents: 1, unplannedCents: 5 };

  test('Weibull 2.5 and 1000 h with costs 1 and 5 is best at 493.05 h (SciPy 1.17 by quadrature: 493.04695)', () => {
    const best = computeOptimum({ shape: 2.5, scale: 1000 }, costs)!;
    expect(best).toBeCloseTo(493.05, 2);
    expect(best).toBeCloseTo(493.04695, 3);
    expect(computeCost({ shape: 2.5, scale: 1000 }, costs, best)).toBeCloseTo(0.003462042738782, 10);
  });

  test('run to failure costs a failure a mean life: 5 / (1000 Γ(1.4))', () => {
    expect(computeCost({ shape: 2.5, scale: 1000 }, costs, 10_000)).toBeCloseTo(0.00563530249, 8);
  });

  test('no wear-out, or a failure that costs no more, has no finite optimum', () => {
    expect(computeOptimum({ shape: 1, scale: 1000 }, costs)).toBeNull();
    expect(computeOptimum({ shape: 0.8, scale: 1000 }, costs)).toBeNull();
    expect(computeOptimum({ shape: 2.5, scale: 1000 }, { plannedCents: 5, unplannedCents: 5 })).toBeNull();
  });
});

describe('advice on an interval', () => {
  const costs = { plannedCents: 20_000, unplannedCents: 100_000 };

  test('says the best hours, and what the present interval costs against them', () => {
    const advice = adviseInterval(NIST, costs, 500);
    if (advice.kind !== 'rebuild_at') throw new Error(advice.reason);
    expect(advice.hours).toBeLessThan(500);
    expect(advice.presentCentsPerHour).toBeGreaterThan(advice.centsPerHour);
    expect(advice.runToFailureCentsPerHour).toBeGreaterThan(advice.presentCentsPerHour!);
  });

  test('is not given when wear-out is not shown: failures as they come by chance (quantiles of an exponential)', () => {
    const chance = Array.from({ length: 12 }, (_, index) => -400 * Math.log(1 - (index + 0.5) / 12));
    expect(adviseInterval(lives(chance, []), costs, 300)).toEqual({
      kind: 'none',
      reason: 'wear_out_not_shown',
    });
  });

  test('is not given on four failures, nor when a failure costs no more than a rebuild', () => {
    expect(adviseInterval(lives([300, 310, 320, 330], [400]), costs, 300)).toEqual({
      kind: 'none',
      reason: 'too_few_failures',
    });
    const same = { plannedCents: 20_000, unplannedCents: 20_000 };
    expect(adviseInterval(NIST, same, 300)).toEqual({ kind: 'none', reason: 'failure_costs_no_more' });
  });
});
