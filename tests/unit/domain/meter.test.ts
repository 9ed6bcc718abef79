import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  MAX_METER_TENTHS,
  type ReadingContext,
  checkMeterSwap,
  checkReading,
  computeBaseTenths,
  computeEngineHours,
  formatTenths,
  parseHoursToTenths,
} from '@/lib/domain/meter';

const now = new Date('2026-07-04T16:00:00Z');
const hoursAgo = (hours: number) => new Date(now.getTime() - hours * 3_600_000);
/** The last reading: 120.0 h, four hours ago. */
const last = { shownTenths: 1200, at: hoursAgo(4) };
const context: ReadingContext = { now, last };
const shows = (shownTenths: number, at = now) => ({ shownTenths, at });

// All expectations are worked by hand from the stated limits: 0.2 h past the clock, 8.0 h at once.
describe('a reading', () => {
  it('is taken as it is when the meter ran as long as it may have', () => {
    expect(checkReading(shows(1225), context)).toEqual({ kind: 'ok', ranTenths: 25 });
  });

  it('may show the same as the last', () => {
    expect(checkReading(shows(1200), context)).toEqual({ kind: 'ok', ranTenths: 0 });
  });

  it('lower than the last is refused with the last value and its instant', () => {
    expect(checkReading(shows(1199), context)).toEqual({
      kind: 'lower',
      lastTenths: 1200,
      lastAt: last.at,
    });
  });

  it('may have run 0.2 h longer than the clock, not 0.3 h', () => {
    expect(checkReading(shows(1242), context).kind).toBe('ok');
    expect(checkReading(shows(1243), context)).toMatchObject({
      kind: 'more_than_clock',
      ranTenths: 43,
      elapsedTenths: 40,
    });
  });

  it('that ran longer than its outing asks for a reason', () => {
    const outing = { ...context, outingFrom: hoursAgo(1) };
    expect(checkReading(shows(1212), outing).kind).toBe('ok');
    expect(checkReading(shows(1213), outing)).toEqual({
      kind: 'unusual',
      ranTenths: 13,
      over: 'outing',
      usualTenths: 10,
    });
  });

  it('of more than 8.0 h at once asks for a reason, even after a week', () => {
    const week = { now, last: { shownTenths: 1200, at: hoursAgo(24 * 7) } };
    expect(checkReading(shows(1280), week).kind).toBe('ok');
    expect(checkReading(shows(1281), week)).toEqual({
      kind: 'unusual',
      ranTenths: 81,
      over: 'limit',
      usualTenths: 80,
    });
  });

  it('has a limit of its own where a unit has one', () => {
    const week = { now, last: { shownTenths: 1200, at: hoursAgo(24 * 7) }, unusualTenths: 20 };
    expect(checkReading(shows(1221), week)).toMatchObject({ kind: 'unusual', usualTenths: 20 });
  });

  it('sent late may not show more than one taken after it', () => {
    const next = { shownTenths: 1210, at: hoursAgo(1) };
    expect(checkReading(shows(1215, hoursAgo(2)), { now, last, next })).toMatchObject({
      kind: 'higher_than_next',
      nextTenths: 1210,
    });
    expect(checkReading(shows(1210, hoursAgo(2)), { now, last, next }).kind).toBe('ok');
  });

  it('that is the first of its meter has run nothing', () => {
    expect(checkReading(shows(48_213), { now, last: null })).toEqual({ kind: 'ok', ranTenths: 0 });
  });

  it.each([
    ['is negative', shows(-1), 'negative'],
    ['is no whole tenth', shows(1210.5), 'not_whole_tenths'],
    ['is no number', shows(NaN), 'not_whole_tenths'],
    ['is more than a meter can show', shows(MAX_METER_TENTHS + 1), 'beyond_meter'],
    ['lies in the future', shows(1201, new Date(now.getTime() + 301_000)), 'in_future'],
  ])('that %s is absurd', (_, reading, why) => {
    expect(checkReading(reading, context)).toEqual({ kind: 'absurd', why });
  });

  it('is never taken when it is below the last or beyond the clock', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 20_000 }),
        fc.integer({ min: 0, max: 20_000 }),
        fc.integer({ min: 0, max: 500 }),
        (before, shown, hours) => {
          const verdict = checkReading(shows(shown), {
            now,
            last: { shownTenths: before, at: hoursAgo(hours) },
          });
          const possible = shown >= before && shown - before <= hours * 10 + 2;
          expect(verdict.kind === 'ok' || verdict.kind === 'unusual').toBe(possible);
        },
      ),
    );
  });
});

describe('a meter swap', () => {
  const swap = { oldFinalTenths: 1210, newFirstTenths: 3 };

  it('leaves engine hours unbroken: 121.0 h on the old meter, 0.3 h on the new at first', () => {
    const base = computeBaseTenths(0, swap);
    expect(computeEngineHours(3, base)).toBe(1210);
    expect(computeEngineHours(10, base)).toBe(1217);
  });

  it('leaves them unbroken over any number of swaps', () => {
    const anySwap = fc.record({ oldFinalTenths: fc.nat(20_000), newFirstTenths: fc.nat(20_000) });
    fc.assert(
      fc.property(fc.array(anySwap, { maxLength: 6 }), (swaps) => {
        let base = 0;
        for (const one of swaps) {
          const before = computeEngineHours(one.oldFinalTenths, base);
          base = computeBaseTenths(base, one);
          expect(computeEngineHours(one.newFirstTenths, base)).toBe(before);
        }
      }),
    );
  });

  it('counts what both meters ran since the last reading', () => {
    expect(checkMeterSwap(swap, shows(8), context)).toEqual({ kind: 'ok', ranTenths: 15 });
  });

  it('is refused when the old meter ended lower than it last showed', () => {
    expect(checkMeterSwap({ ...swap, oldFinalTenths: 1199 }, shows(8), context)).toMatchObject({
      kind: 'lower',
      lastTenths: 1200,
    });
  });

  it('is refused when the new meter shows less than at first', () => {
    expect(checkMeterSwap(swap, shows(2), context)).toMatchObject({ kind: 'lower', lastTenths: 3 });
  });

  it('is refused when both together ran longer than the clock', () => {
    expect(checkMeterSwap(swap, shows(36), context)).toMatchObject({
      kind: 'more_than_clock',
      ranTenths: 43,
    });
  });

  it('is absurd with a negative first reading', () => {
    expect(checkMeterSwap({ ...swap, newFirstTenths: -1 }, shows(2), context).kind).toBe('absurd');
  });
});

describe('hours as people write them', () => {
  it.each<[string | number, number]>([
    ['1472.7', 14_727],
    [1472.7, 14_727],
    [' 0.1 ', 1],
    ['12', 120],
    [0, 0],
    ['0012.0', 120],
    ['99999.9', 999_999],
  ])('%j is read as %s tenths', (text, tenths) => {
    expect(parseHoursToTenths(text)).toEqual({ ok: true, tenths });
  });

  it.each<[string | number, string]>([
    ['1472.70', 'one decimal place'],
    [12.34, 'one decimal place'],
    ['-1', 'cannot be negative'],
    [-0.1, 'cannot be negative'],
    ['12,5', 'must be a number'],
    ['1e3', 'must be a number'],
    ['0x10', 'must be a number'],
    ['', 'must be a number'],
    ['.5', 'must be a number'],
    ['12.', 'must be a number'],
    [NaN, 'must be a number'],
    [Infinity, 'must be a number'],
    ['100000', 'more than 99999.9'],
  ])('%j is refused: %s', (text, reason) => {
    expect(parseHoursToTenths(text)).toMatchObject({ ok: false, reason: expect.stringContaining(reason) });
  });

  it('come back as they were written, for every tenth', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: MAX_METER_TENTHS }), (tenths) => {
        expect(parseHoursToTenths(formatTenths(tenths))).toEqual({ ok: true, tenths });
        expect(parseHoursToTenths(tenths / 10)).toEqual({ ok: true, tenths });
      }),
    );
  });
});
