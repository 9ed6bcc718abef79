import { type CalendarDay, type Weekday, WEEKDAYS, isCalendarDay } from './calendar-day';

export type Frequency = 'DAILY' | 'WEEKLY' | 'MONTHLY' | 'YEARLY';
/** A weekday as the number of days after Monday; `nth` counts from the end when negative, null means each. */
export type ByDay = { weekday: number; nth: number | null };

/** A recurrence rule taken apart. A list left empty is a part the rule does not have. */
export type Recurrence = {
  freq: Frequency;
  interval: number;
  count: number | null;
  until: CalendarDay | null;
  /** First day of the week, as the number of days after Monday. */
  weekStart: number;
  byMonth: number[];
  byWeekNo: number[];
  byYearDay: number[];
  byMonthDay: number[];
  byDay: ByDay[];
  bySetPos: number[];
};

/** The longest INTERVAL of each frequency. */
export const MAX_INTERVAL: Record<Frequency, number> = {
  DAILY: 9999,
  WEEKLY: 999,
  MONTHLY: 999,
  YEARLY: 99,
};
export const MAX_COUNT = 9999;

type Reader<T> = (text: string) => T | undefined;

const whole =
  (min: number, max: number): Reader<number> =>
  (text) => {
    const value = /^\d{1,4}$/.test(text) ? Number(text) : NaN;
    return value >= min && value <= max ? value : undefined;
  };

/** A number other than 0, counted from the end when it has a minus. */
const signed =
  (max: number): Reader<number> =>
  (text) => {
    const value = /^[+-]?\d{1,3}$/.test(text) ? Number(text) : NaN;
    return value !== 0 && Math.abs(value) <= max ? value : undefined;
  };

const listOf =
  <T>(read: Reader<T>): Reader<T[]> =>
  (text) => {
    const values = [...new Set(text.split(','))].map(read);
    return values.every((value) => value !== undefined) ? (values as T[]) : undefined;
  };

const weekday: Reader<number> = (text) => {
  const index = WEEKDAYS.indexOf(text as Weekday);
  return index < 0 ? undefined : index;
};

const nthWeekday: Reader<ByDay> = (text) => {
  const day = weekday(text.slice(-2));
  const nth = text.length > 2 ? signed(53)(text.slice(0, -2)) : null;
  return day === undefined || nth === undefined ? undefined : { weekday: day, nth };
};

const frequency: Reader<Frequency> = (text) => (text in MAX_INTERVAL ? (text as Frequency) : undefined);

const lastDay: Reader<CalendarDay> = (text) => {
  const day = `${text.slice(0, 4)}-${text.slice(4, 6)}-${text.slice(6)}`;
  return /^\d{8}$/.test(text) && isCalendarDay(day) ? day : undefined;
};

const part = <K extends keyof Recurrence>(
  key: K,
  expects: string,
  read: Reader<NonNullable<Recurrence[K]>>,
) => ({
  expects,
  put: (target: Partial<Recurrence>, text: string): boolean => {
    const value = read(text);
    if (value !== undefined) target[key] = value;
    return value !== undefined;
  },
});

/** The allowed rule parts and what each may hold; every other part is refused. */
export const PARTS = {
  FREQ: part('freq', 'must be DAILY, WEEKLY, MONTHLY or YEARLY', frequency),
  INTERVAL: part('interval', 'must be a whole number from 1 to 9999', whole(1, 9999)),
  COUNT: part('count', `must be a whole number from 1 to ${MAX_COUNT}`, whole(1, MAX_COUNT)),
  UNTIL: part('until', 'must be a date such as 20271231, without a time of day', lastDay),
  WKST: part('weekStart', 'must be one of MO, TU, WE, TH, FR, SA, SU', weekday),
  BYMONTH: part('byMonth', 'must list months from 1 to 12', listOf(whole(1, 12))),
  BYWEEKNO: part('byWeekNo', 'must list weeks from 1 to 53 or -53 to -1', listOf(signed(53))),
  BYYEARDAY: part('byYearDay', 'must list days from 1 to 366 or -366 to -1', listOf(signed(366))),
  BYMONTHDAY: part('byMonthDay', 'must list days from 1 to 31 or -31 to -1', listOf(signed(31))),
  BYDAY: part('byDay', 'must list weekdays such as MO, or 1MO and -1FR', listOf(nthWeekday)),
  BYSETPOS: part('bySetPos', 'must list places from 1 to 366 or -366 to -1', listOf(signed(366))),
};

export type PartName = keyof typeof PARTS;

type Clash = { part: PartName; reason: string };
const clashOf = (part: PartName, reason: string): Clash => ({ part, reason: `${part} ${reason}` });

function findDayClash({ freq, byMonth, byWeekNo, byDay }: Recurrence): Clash | undefined {
  const largest = byDay.reduce((most, { nth }) => Math.max(most, Math.abs(nth ?? 0)), 0);
  if (largest === 0) return undefined;
  if (freq !== 'MONTHLY' && freq !== 'YEARLY') {
    return clashOf('BYDAY', 'takes a number only with MONTHLY or YEARLY');
  }
  if (byWeekNo.length > 0) return clashOf('BYDAY', 'takes no number beside BYWEEKNO');
  const withinMonth = freq === 'MONTHLY' || byMonth.length > 0;
  return withinMonth && largest > 5 ? clashOf('BYDAY', 'counts at most 5 within a month') : undefined;
}

/** Why parts do not go together by RFC 5545 section 3.3.10, or undefined when they do. */
export function findClash(rule: Recurrence): Clash | undefined {
  const { freq, byMonth, byWeekNo, byYearDay, byMonthDay, byDay, bySetPos } = rule;
  if (rule.interval > MAX_INTERVAL[freq]) {
    return clashOf('INTERVAL', `is at most ${MAX_INTERVAL[freq]} with FREQ=${freq}`);
  }
  if (rule.count !== null && rule.until !== null) return clashOf('UNTIL', 'cannot stand beside COUNT');
  if (byMonthDay.length && freq === 'WEEKLY') return clashOf('BYMONTHDAY', 'cannot be used with FREQ=WEEKLY');
  if (byYearDay.length && freq !== 'YEARLY') return clashOf('BYYEARDAY', 'needs FREQ=YEARLY');
  if (byWeekNo.length && freq !== 'YEARLY') return clashOf('BYWEEKNO', 'needs FREQ=YEARLY');
  if (byWeekNo.length && !byDay.length) return clashOf('BYWEEKNO', 'needs BYDAY to name the day of the week');
  const others = byMonth.length + byWeekNo.length + byYearDay.length + byMonthDay.length + byDay.length;
  if (bySetPos.length && others === 0) return clashOf('BYSETPOS', 'needs another BY part to choose from');
  return findDayClash(rule);
}
