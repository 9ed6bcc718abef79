import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { addDays, WEEKDAYS } from '@/lib/domain/calendar-day';
import {
  firstAfter,
  firstOnOrAfter,
  isPlain,
  occurrencesBetween,
  parseRecurrence,
} from '@/lib/domain/recurrence';

function read(text: string) {
  const parsed = parseRecurrence(text);
  if (!parsed.ok) throw new Error(parsed.reason);
  return parsed.recurrence;
}

// Expectations are worked by hand with a calendar of 2026, which begins on a Thursday.
describe('the text of a rule', () => {
  it('is read in any case, order and with blanks around it', () => {
    expect(read(' interval=2;byday=tu;freq=weekly ')).toEqual(read('FREQ=WEEKLY;INTERVAL=2;BYDAY=TU'));
  });

  it('may name a value twice without counting it twice', () => {
    const rule = read('FREQ=MONTHLY;BYMONTHDAY=1,1;BYSETPOS=1,1');
    expect(occurrencesBetween(rule, '2026-01-01', '2026-01-01', '2026-02-28')).toEqual([
      '2026-01-01',
      '2026-02-01',
    ]);
  });

  it('is plain when it has no BY part, whatever ends it', () => {
    expect(isPlain(read('FREQ=MONTHLY;INTERVAL=3;COUNT=4;WKST=SU'))).toBe(true);
    expect(isPlain(read('FREQ=MONTHLY;BYMONTHDAY=1'))).toBe(false);
  });
});

describe('weekdays with and without a number', () => {
  it('add up: every Monday and the last Friday', () => {
    const rule = read('FREQ=MONTHLY;BYDAY=MO,-1FR');
    expect(occurrencesBetween(rule, '2026-01-01', '2026-01-01', '2026-01-31')).toEqual([
      '2026-01-05',
      '2026-01-12',
      '2026-01-19',
      '2026-01-26',
      '2026-01-30',
    ]);
  });
});

describe('places of a set', () => {
  it('are taken from the whole first week, also where it begins before the start', () => {
    const rule = read('FREQ=WEEKLY;BYDAY=MO,WE,FR;BYSETPOS=2');
    expect(occurrencesBetween(rule, '2026-01-02', '2026-01-01', '2026-01-16')).toEqual([
      '2026-01-07',
      '2026-01-14',
    ]);
  });

  it('are taken once where a place from the front is one from the back', () => {
    const rule = read('FREQ=MONTHLY;BYMONTHDAY=1,2;BYSETPOS=2,-1');
    expect(occurrencesBetween(rule, '2026-01-01', '2026-01-01', '2026-02-28')).toEqual([
      '2026-01-02',
      '2026-02-02',
    ]);
  });
});

describe('the first occurrence', () => {
  const monthly = read('FREQ=MONTHLY;BYMONTHDAY=15');

  it('on or after a day may be that day, after it may not', () => {
    expect(firstOnOrAfter(monthly, '2026-01-01', '2026-03-15')).toBe('2026-03-15');
    expect(firstAfter(monthly, '2026-01-01', '2026-03-15')).toBe('2026-04-15');
  });

  it('is never before the start', () => {
    expect(firstOnOrAfter(monthly, '2026-05-16', '2020-01-01')).toBe('2026-06-15');
    expect(firstOnOrAfter(read('FREQ=DAILY;INTERVAL=3'), '2026-05-16', '2020-01-01')).toBe('2026-05-16');
  });

  it('is none when COUNT or UNTIL is used up', () => {
    expect(firstAfter(read('FREQ=DAILY;COUNT=3'), '2026-01-01', '2026-01-03')).toBeNull();
    expect(firstAfter(read('FREQ=DAILY;UNTIL=20260103'), '2026-01-01', '2026-01-03')).toBeNull();
    expect(firstAfter(read('FREQ=MONTHLY;BYDAY=1MO;COUNT=1'), '2026-01-01', '2026-01-05')).toBeNull();
  });

  it('is found for a start long ago', () => {
    // 76 years of 365 days and 19 leap days make 27,759 days to 1 January 2026: an odd number.
    expect(firstAfter(read('FREQ=DAILY;INTERVAL=2'), '1950-01-01', '2026-01-01')).toBe('2026-01-02');
    expect(firstAfter(read('FREQ=YEARLY;BYMONTH=2;BYMONTHDAY=29'), '1960-02-29', '2096-03-01')).toBe(
      '2104-02-29',
    );
  });

  it('of a day that is not real is refused', () => {
    expect(() => firstAfter(monthly, '2026-02-30', '2026-03-01')).toThrow(RangeError);
    expect(() => occurrencesBetween(monthly, '2026-01-01', '2026-02-30', '2026-03-01')).toThrow(RangeError);
  });
});

describe('a window that ends before it begins', () => {
  it('has no occurrence', () => {
    expect(occurrencesBetween(read('FREQ=DAILY'), '2026-01-01', '2026-02-01', '2026-01-31')).toEqual([]);
  });
});

// Every day looked at, one by one, with the date library of the language as the judge of months and weekdays.
describe('days and weeks of some months', () => {
  const START = '2026-01-01';
  const everyDay = Array.from({ length: 365 * 6 }, (_, index) => ({ index, day: addDays(START, index) }));
  const weekdayOf = (day: string) => (new Date(`${day}T00:00:00Z`).getUTCDay() + 6) % 7;
  const months = fc.uniqueArray(fc.integer({ min: 1, max: 12 }), { minLength: 1, maxLength: 3 });
  const until = everyDay.at(-1)!.day;

  it('are all found, whatever the INTERVAL', () => {
    fc.assert(
      fc.property(months, fc.integer({ min: 1, max: 80 }), (byMonth, interval) => {
        const rule = read(`FREQ=DAILY;INTERVAL=${interval};BYMONTH=${byMonth.join()}`);
        const days = everyDay.filter(
          ({ index, day }) => index % interval === 0 && byMonth.includes(Number(day.slice(5, 7))),
        );
        expect(occurrencesBetween(rule, START, START, until)).toEqual(days.map(({ day }) => day));
      }),
    );
  });

  it('are all found in weeks that begin on any day', () => {
    const weekday = fc.integer({ min: 0, max: 6 });
    fc.assert(
      fc.property(
        months,
        fc.integer({ min: 1, max: 60 }),
        weekday,
        fc.uniqueArray(weekday, { minLength: 1 }),
        (byMonth, interval, weekStart, byDay) => {
          const names = byDay.map((day) => WEEKDAYS[day]).join();
          const rule = read(
            `FREQ=WEEKLY;INTERVAL=${interval};BYMONTH=${byMonth.join()};BYDAY=${names};WKST=${WEEKDAYS[weekStart]}`,
          );
          const intoFirstWeek = (weekdayOf(START) - weekStart + 7) % 7;
          const days = everyDay.filter(
            ({ index, day }) =>
              Math.floor((index + intoFirstWeek) / 7) % interval === 0 &&
              byDay.includes(weekdayOf(day)) &&
              byMonth.includes(Number(day.slice(5, 7))),
          );
          expect(occurrencesBetween(rule, START, START, until)).toEqual(days.map(({ day }) => day));
        },
      ),
    );
  });
});
