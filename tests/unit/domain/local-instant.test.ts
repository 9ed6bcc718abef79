import { describe, expect, test } from 'vitest';
import { localInstant, localMinutes } from '@/lib/domain/local-instant';

/** Offsets of the IANA database: New York is UTC-5, and UTC-4 from 2026-03-08 02:00 to 2026-11-01 02:00. */
describe('a clock at the dock', () => {
  test.each([
    ['2026-01-15', 14 * 60 + 30, '2026-01-15T19:30:00.000Z'],
    ['2026-07-15', 14 * 60 + 30, '2026-07-15T18:30:00.000Z'],
    ['2026-03-08', 12 * 60, '2026-03-08T16:00:00.000Z'],
    ['2026-03-08', 60, '2026-03-08T06:00:00.000Z'],
    ['2026-11-01', 12 * 60, '2026-11-01T17:00:00.000Z'],
    ['2026-11-01', 30, '2026-11-01T04:30:00.000Z'],
  ])('that shows %s and %d minutes past midnight in New York shows %s', (day, minutes, instant) => {
    const found = localInstant(day, minutes, 'America/New_York');
    expect(found.toISOString()).toBe(instant);
    expect(localMinutes(found, 'America/New_York')).toBe(minutes);
  });

  test('that goes back shows 01:30 twice, and the earlier one is meant', () => {
    expect(localInstant('2026-11-01', 90, 'America/New_York').toISOString()).toBe('2026-11-01T05:30:00.000Z');
  });

  test('that leaps over 02:30 makes it 03:30', () => {
    expect(localInstant('2026-03-08', 150, 'America/New_York').toISOString()).toBe(
      '2026-03-08T07:30:00.000Z',
    );
  });
});
