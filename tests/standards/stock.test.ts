import { describe, expect, test } from 'vitest';
import { normalChance, normalQuantile } from '@/lib/domain/normal';
import { computeIntermittentDemand, smooth } from '@/lib/domain/smoothing';
import { adviseOrder, computeDemand, computeNeed, computeReorderPoint } from '@/lib/domain/stock-planning';

test('normal quantiles by NIST/SEMATECH e-Handbook 1.3.6.7.1 (from memory) and Algorithm AS 241’s own checks', () => {
  const table = [0.9, 0.95, 0.975, 0.99].map((p) => Number(normalQuantile(p).toFixed(3)));
  expect(table).toEqual([1.282, 1.645, 1.96, 2.326]);
  expect(normalQuantile(0.25)).toBeCloseTo(-0.6744897501960817, 14);
  expect(normalQuantile(0.001)).toBeCloseTo(-3.090232306167814, 14);
  expect(normalQuantile(1e-20)).toBeCloseTo(-9.262340089798408, 13);
  expect(() => normalQuantile(1)).toThrow(RangeError);
});

test('normal chances, worked out with SciPy 1.17, and back again', () => {
  expect(normalChance(-3)).toBeCloseTo(0.00134989803, 11);
  expect(normalChance(1.2345)).toBeCloseTo(0.891491677, 9);
  expect(normalChance(-9)).toBe(0);
  for (const p of [0.01, 0.1, 0.5, 0.8, 0.999]) expect(normalChance(normalQuantile(p))).toBeCloseTo(p, 12);
});

test('single smoothing by NIST/SEMATECH e-Handbook 6.4.3.1', () => {
  const y = [71, 70, 69, 68, 64, 65, 72, 78, 75, 75, 75, 70];
  const printed = [71, 70.9, 70.71, 70.44, 69.8, 69.32, 69.58, 70.43, 70.88, 71.29, 71.67];
  smooth(y.slice(0, 11), 0.1).forEach((value, index) => {
    expect(Math.abs(value - printed[index]!)).toBeLessThanOrEqual(0.0051);
  });
});

describe('demand that comes now and then', () => {
  test('Croston 0.949181, Syntetos and Boylan 0.901722 (worked out apart from this project)', () => {
    const demand = computeIntermittentDemand([0, 0, 3, 0, 0, 0, 2, 0, 1, 0, 0, 4], 0.1)!;
    expect(demand.croston).toBeCloseTo(0.949181, 6);
    expect(demand.corrected).toBeCloseTo(0.901722, 6);
  });

  test('is unknown when nothing was ever wanted', () => {
    expect(computeIntermittentDemand([0, 0, 0])).toBeNull();
  });
});

test('5 a day, σ 2, 3 days, 95 %: safety stock 5.70, reorder at 20.7', () => {
  const facts = { perDay: 5, spreadPerDay: 2, leadDays: 3, serviceLevel: 0.95 };
  const { safetyStock, reorderPoint } = computeReorderPoint(facts);
  expect(safetyStock).toBeCloseTo(5.7, 2);
  expect(reorderPoint).toBeCloseTo(20.7, 1);
  // A lead time that varies by a day adds (5 × 1)² to the variance: 1.6449 × √37 (by hand).
  expect(computeReorderPoint({ ...facts, leadSpreadDays: 1 }).safetyStock).toBeCloseTo(10.005, 2);
});

// Worked by hand.
describe('what the shelf must hold', () => {
  const sure = (day: number, days = 60) => Array.from({ length: days }, (_, ahead) => Number(ahead >= day));

  test('a duty that is as likely as not wants half its kits, give or take half of them', () => {
    const [, demand] = computeDemand([{ quantity: 4, chanceBy: [0, 0.5] }], 0, 2);
    expect(demand).toEqual({ mean: 2, variance: 4 });
  });

  test('duties add up, and repairs come on top as they come', () => {
    const uses = [
      { quantity: 3, chanceBy: sure(0) },
      { quantity: 2, chanceBy: sure(1) },
    ];
    const [first, second] = computeDemand(uses, 0.1, 2);
    expect(first!.mean).toBeCloseTo(3.1, 12);
    expect(second).toMatchObject({ mean: expect.closeTo(5.2, 12), variance: expect.closeTo(0.2, 12) });
  });

  test('needs are whole parts, none of nothing', () => {
    expect(computeNeed({ mean: 3, variance: 0 }, 0.95)).toBe(3);
    expect(computeNeed({ mean: 2, variance: 1 }, 0.95)).toBe(4);
    expect(computeNeed({ mean: 0, variance: 0 }, 0.95)).toBe(0);
  });

  const facts = {
    today: '2026-06-01',
    onHand: 3,
    arrivals: [],
    demand: computeDemand(
      [
        { quantity: 3, chanceBy: sure(10) },
        { quantity: 2, chanceBy: sure(20) },
        { quantity: 4, chanceBy: sure(40) },
      ],
      0,
      60,
    ),
    leadDays: 14,
    coverDays: 7,
    serviceLevel: 0.95,
  };

  test('is ordered the lead time before it runs short, enough for what comes until the cover ends', () => {
    expect(adviseOrder(facts)).toEqual({ shortOn: '2026-06-21', orderBy: '2026-06-07', quantity: 2 });
    expect(adviseOrder({ ...facts, coverDays: 30 })).toMatchObject({ quantity: 6 });
  });

  test('what is on its way counts from its day on, and what is late from today', () => {
    const coming = { ...facts, arrivals: [{ on: '2026-06-20', quantity: 6 }] };
    expect(adviseOrder(coming)).toBeNull();
    expect(adviseOrder({ ...facts, arrivals: [{ on: '2026-06-25', quantity: 6 }] })).toMatchObject({
      shortOn: '2026-06-21',
    });
    expect(adviseOrder({ ...facts, arrivals: [{ on: '2026-05-20', quantity: 6 }] })).toBeNull();
  });

  test('an order that should have gone out says so', () => {
    expect(adviseOrder({ ...facts, onHand: 0 })).toMatchObject({
      shortOn: '2026-06-11',
      orderBy: '2026-05-28',
    });
  });
});
