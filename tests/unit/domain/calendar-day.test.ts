import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addDays,
  dayOfNumber,
  daysBetween,
  isCalendarDay,
  isTimeZone,
  numberOfDay,
  partsOfDay,
  weekdayOf,
} from '@/lib/domain/calendar-day';

describe('a calendar day', () => {
  it.each(['2024-02-29', '2000-02-29', '1900-01-01', '9999-12-31', '2026-12-31'])('%s is one', (day) => {
    expect(isCalendarDay(day)).toBe(true);
  });

  it.each([
    '2023-02-29',
    '2100-02-29',
    '2026-04-31',
    '2026-00-10',
    '2026-13-01',
    '2026-01-00',
    '2026-1-1',
    '26-01-01',
    '2026-01-01T00:00:00Z',
    ' 2026-01-01',
    '2026-01-01\n',
    '0026-01-01',
    '1899-12-31',
    '',
    null,
    undefined,
    20260101,
    new Date(0),
  ])('%s is none', (value) => {
    expect(isCalendarDay(value)).toBe(false);
  });

  it('that is not real is refused by name', () => {
    expect(() => partsOfDay('2026-02-30')).toThrow('2026-02-30');
    expect(() => addDays('soon', 1)).toThrow(RangeError);
    expect(() => addDays('9999-12-31', 1)).toThrow(RangeError);
  });
});

describe('arithmetic', () => {
  // 2000-03-01 is a Wednesday, and the 400-year cycle has 146,097 days: from memory, then as Date has it below.
  it('counts days over leap years and centuries', () => {
    expect(addDays('2024-02-28', 1)).toBe('2024-02-29');
    expect(addDays('2023-02-28', 1)).toBe('2023-03-01');
    expect(addDays('2026-01-01', -1)).toBe('2025-12-31');
    expect(daysBetween('2000-01-01', '2400-01-01')).toBe(146_097);
    expect(weekdayOf('2000-03-01')).toBe('WE');
  });

  it('agrees with the UTC calendar of Date for every day from 1900 to 2199', () => {
    const first = Date.UTC(1900, 0, 1) / 86_400_000;
    const last = Date.UTC(2199, 11, 31) / 86_400_000;
    for (let number = first; number <= last; number++) {
      const date = new Date(number * 86_400_000);
      const day = date.toISOString().slice(0, 10);
      if (dayOfNumber(number) !== day || numberOfDay(day) !== number) expect(dayOfNumber(number)).toBe(day);
      if (weekdayOf(day) !== ['SU', 'MO', 'TU', 'WE', 'TH', 'FR', 'SA'][date.getUTCDay()]) {
        expect.fail(`${day} is not ${weekdayOf(day)}`);
      }
    }
    expect(last - first + 1).toBe(300 * 365 + 73);
  });

  it('adding and counting undo each other', () => {
    fc.assert(
      fc.property(fc.nat(100_000), fc.integer({ min: -20_000, max: 20_000 }), (from, days) => {
        const day = dayOfNumber(from);
        expect(daysBetween(day, addDays(day, days))).toBe(days);
      }),
    );
  });
});

describe('a time zone', () => {
  it.each(['America/New_York', 'Europe/Madrid', 'UTC'])('%s is known', (zone) => {
    expect(isTimeZone(zone)).toBe(true);
  });

  it.each(['Lake/Nowhere', '', 'New York'])('%j is not', (zone) => {
    expect(isTimeZone(zone)).toBe(false);
  });
});
