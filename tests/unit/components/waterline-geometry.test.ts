import { describe, expect, test } from 'vitest';
import {
  chooseScale,
  distanceFromTop,
  governingLimit,
  heightOn,
  placeUnit,
  sortLowestFirst,
  ticksOf,
  type WaterlineUnit,
} from '@/components/waterline/geometry';

// All values worked by hand.

const unit = (tenthsToHold: number | null, daysToHold: number | null, rate?: number): WaterlineUnit => ({
  fleetNumber: 'NB-01',
  tenthsToHold,
  daysToHold,
  state: 'ready',
  hoursPerDayTenths: rate,
});

test('without a rate five hours count as three days', () => {
  expect(governingLimit(unit(50, 3))).toEqual({ by: 'hours', amount: 50 });
  expect(governingLimit(unit(51, 3))).toEqual({ by: 'days', amount: 3 });
  expect(governingLimit(unit(50, 4))).toEqual({ by: 'hours', amount: 50 });
});

test('with a rate the hours are turned into days by it', () => {
  // 12.0 h at 4.0 h a day last 3 days.
  expect(governingLimit(unit(120, 4, 40))).toEqual({ by: 'hours', amount: 120 });
  expect(governingLimit(unit(120, 2, 40))).toEqual({ by: 'days', amount: 2 });
  // A unit that does not run is held by the calendar rule of thumb, not divided by zero.
  expect(governingLimit(unit(50, 2, 0))).toEqual({ by: 'days', amount: 2 });
});

test('a limit that is past comes before one that is not', () => {
  expect(governingLimit(unit(300, -1))).toEqual({ by: 'days', amount: -1 });
  expect(governingLimit(unit(-1, 90))).toEqual({ by: 'hours', amount: -1 });
});

test('a single limit governs alone, and no limit is none', () => {
  expect(governingLimit(unit(null, 9))).toEqual({ by: 'days', amount: 9 });
  expect(governingLimit(unit(9, null))).toEqual({ by: 'hours', amount: 9 });
  expect(governingLimit(unit(null, null))).toBeNull();
});

test('the scale is the finest that shows the unit', () => {
  expect(chooseScale([unit(100, null)]).tenths).toBe(100);
  expect(chooseScale([unit(101, null)]).tenths).toBe(250);
  expect(chooseScale([unit(null, 31)]).days).toBe(60);
  expect(chooseScale([unit(9999, null)]).tenths).toBe(5000);
  expect(chooseScale([]).tenths).toBe(100);
});

test('the deep shows half of what the air does, and everything past its hold fits', () => {
  expect(chooseScale([unit(-50, null)]).tenths).toBe(100);
  expect(chooseScale([unit(-51, null)]).tenths).toBe(250);
});

test('one unit in four may float beyond the scale', () => {
  expect(chooseScale([unit(40, null), unit(50, null), unit(60, null), unit(900, null)]).tenths).toBe(100);
  expect(chooseScale([unit(40, null), unit(60, null), unit(900, null)]).tenths).toBe(1000);
});

test('a unit stands at its share of the scale, and is clipped at both ends', () => {
  const scale = chooseScale([unit(250, null)]);
  expect(placeUnit(unit(125, null), scale)).toMatchObject({ height: 0.5, beyond: false });
  expect(placeUnit(unit(null, 6), scale)).toMatchObject({ height: 0.4, beyond: false });
  expect(placeUnit(unit(300, null), scale)).toMatchObject({ height: 1, beyond: true });
  expect(placeUnit(unit(-300, null), scale)).toMatchObject({ height: -0.5, beyond: true });
  expect(placeUnit(unit(null, null), scale)).toMatchObject({ height: 1, beyond: false, limit: null });
});

test('the water line lies at two thirds of the picture', () => {
  expect(distanceFromTop(1, 90)).toBe(0);
  expect(distanceFromTop(0, 90)).toBe(60);
  expect(distanceFromTop(-0.5, 90)).toBe(90);
});

test('ticks count down from the top through the line', () => {
  const ticks = ticksOf(chooseScale([unit(250, null)]));
  expect(ticks.map((tick) => tick.hours)).toEqual([25, 20, 15, 10, 5, 0, -5, -10]);
  expect(ticks.map((tick) => tick.days)).toEqual([15, 12, 9, 6, 3, 0, -3, -6]);
  expect(ticksOf(chooseScale([unit(1, null)])).map((tick) => tick.hours)).toEqual([10, 5, 0, -5]);
});

test('the lowest unit comes first, alike ones by number, and those without a limit last', () => {
  const named = (fleetNumber: string, tenths: number | null, days: number | null) => ({
    ...unit(tenths, days),
    fleetNumber,
  });
  const units = [
    named('free', null, null),
    named('NB-10', 50, null),
    named('NB-9', null, 3),
    named('sunk', 400, -1),
    named('high', 900, 90),
  ];
  expect(sortLowestFirst(units).map((each) => each.fleetNumber)).toEqual([
    'sunk',
    'NB-9',
    'NB-10',
    'high',
    'free',
  ]);
  expect(units[0]?.fleetNumber).toBe('free');
});

describe('outings', () => {
  const scaleOf50 = { tenths: 500, days: 30, steps: 5 };
  const counted = { ...unit(229, 81), state: 'held' as const };

  test('a unit whose outings are used up lies on the line, whatever hours are left', () => {
    expect(governingLimit({ ...counted, outingsToHold: 0 })).toEqual({ by: 'outings', amount: 0 });
    expect(placeUnit({ ...counted, outingsToHold: 0 }, scaleOf50).height).toBe(0);
  });

  test('an outing counts as an hour: five of either take three days', () => {
    expect(governingLimit({ ...counted, outingsToHold: 22 })).toEqual({ by: 'outings', amount: 22 });
    expect(governingLimit({ ...counted, outingsToHold: 23 })).toEqual({ by: 'hours', amount: 229 });
    expect(heightOn(scaleOf50, { by: 'outings', amount: 25 })).toBe(0.5);
  });
});
