import fc from 'fast-check';
import { WEEKDAYS, addDays, weekdayOf } from '@/lib/domain/calendar-day';

/** A rule, its start, and the days between which it is expanded. */
export type RecurrenceCase = { rule: string; start: string; from: string; to: string };

const weekday = fc.constantFrom(...WEEKDAYS);
const signed = (max: number) =>
  fc.integer({ min: 1, max }).chain((value) => fc.constantFrom(value, value, -value));
const list = <T>(item: fc.Arbitrary<T>, maxLength: number) =>
  fc.uniqueArray(item, { minLength: 1, maxLength }).map((items) => items.join(','));
const sometimes = (part: fc.Arbitrary<string>) =>
  fc.oneof({ weight: 3, arbitrary: fc.constant('') }, { weight: 2, arbitrary: part });

const months = list(fc.integer({ min: 1, max: 12 }), 4).map((text) => `BYMONTH=${text}`);
const monthDays = list(signed(31), 4).map((text) => `BYMONTHDAY=${text}`);
const yearDays = list(signed(366), 4).map((text) => `BYYEARDAY=${text}`);
const weekdays = list(weekday, 4).map((text) => `BYDAY=${text}`);
// All numbered or none: dateutil asks a day to fit both kinds where RFC 5545 adds them up.
const numbered = (max: number) =>
  fc.oneof(
    weekdays,
    list(
      fc.tuple(signed(max), weekday).map(([nth, day]) => `${nth}${day}`),
      4,
    ).map((text) => `BYDAY=${text}`),
  );
// Weeks that may reach over New Year are left out: dateutil 2.8.2 counts 53 weeks in years that have 52, so
// that it misses 1 January 2011, in ISO week 52 of 2010. They are held against ISO 8601 by themselves.
const weeks = fc
  .tuple(list(fc.oneof(fc.integer({ min: 2, max: 51 }), fc.integer({ min: -51, max: -2 })), 3), weekdays)
  .map(([text, days]) => `BYWEEKNO=${text};${days}`);
const places = list(signed(5), 3).map((text) => `BYSETPOS=${text}`);

const parts: Record<string, fc.Arbitrary<string>[]> = {
  DAILY: [sometimes(months), sometimes(monthDays), sometimes(weekdays)],
  WEEKLY: [sometimes(months), sometimes(weekdays)],
  MONTHLY: [sometimes(months), sometimes(monthDays), sometimes(numbered(5))],
  YEARLY: [
    fc.oneof(
      fc
        .tuple(months, sometimes(monthDays), sometimes(numbered(5)))
        .map((texts) => texts.filter(Boolean).join(';')),
      fc.tuple(sometimes(monthDays), sometimes(numbered(53))).map((texts) => texts.filter(Boolean).join(';')),
      fc
        .tuple(yearDays, sometimes(months), sometimes(weekdays))
        .map((texts) => texts.filter(Boolean).join(';')),
      fc.tuple(weeks, sometimes(months)).map((texts) => texts.filter(Boolean).join(';')),
    ),
  ],
};
const longest: Record<string, number> = { DAILY: 40, WEEKLY: 9, MONTHLY: 15, YEARLY: 5 };
const spans: Record<string, number> = { DAILY: 900, WEEKLY: 1500, MONTHLY: 3000, YEARLY: 6000 };

const day = fc.integer({ min: 0, max: 11_000 }).map((days) => addDays('1995-01-01', days));
const end = fc.oneof(
  { weight: 3, arbitrary: fc.constant('') },
  fc.integer({ min: 1, max: 60 }).map((count) => `COUNT=${count}`),
  fc
    .integer({ min: 4000, max: 13_000 })
    .map((days) => addDays('1995-01-01', days))
    .map((until) => `UNTIL=${until.replaceAll('-', '')}`),
);

/** Rules of every allowed part, with starts from 1995 to 2025 and windows that begin up to years later. */
export const recurrenceCase: fc.Arbitrary<RecurrenceCase> = fc
  .constantFrom(...Object.keys(parts))
  .chain((freq) =>
    fc.record({
      freq: fc.constant(freq),
      interval: fc.integer({ min: 1, max: longest[freq]! }),
      by: fc.tuple(...parts[freq]!).map((texts) => texts.filter(Boolean)),
      setPos: sometimes(places),
      wkst: fc.option(weekday, { nil: null }),
      end,
      start: day,
      wait: fc.integer({ min: -10, max: 1200 }),
      span: fc.integer({ min: 30, max: spans[freq]! }),
    }),
  )
  .map(({ freq, interval, by, setPos, wkst, end: ending, start, wait, span }) => {
    const places = by.length > 0 ? setPos : '';
    // dateutil begins the first week of a WEEKLY rule at its start and lets BYSETPOS choose from what is left
    // of it; the whole week is meant, as it is with months. Weeks that begin at the start settle it.
    const weekStart = places && freq === 'WEEKLY' ? weekdayOf(start) : wkst;
    const rule = [
      `FREQ=${freq}`,
      `INTERVAL=${interval}`,
      ...by,
      places,
      weekStart && `WKST=${weekStart}`,
      ending,
    ];
    const from = addDays(start, wait);
    return { rule: rule.filter(Boolean).join(';'), start, from, to: addDays(from, span) };
  });
