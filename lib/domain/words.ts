/** Small pieces of English that several modules write sentences with. */
import { type CalendarDay, numberOfDay, partsOfNumber, weekdayIndex } from './calendar-day';
import { formatTenths } from './meter';

export const WEEKDAY_NAMES = ['Monday', 'Tuesday', 'Wednesday', 'Thursday', 'Friday', 'Saturday', 'Sunday'];
export const MONTH_NAMES = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
];

/** 'a', 'a and b', 'a, b and c'. */
export function joinWords(words: readonly string[], conjunction = 'and'): string {
  const last = words.at(-1) ?? '';
  return words.length < 2 ? last : `${words.slice(0, -1).join(', ')} ${conjunction} ${last}`;
}

/** '1 day', '3 days'. */
export function countOf(count: number, noun: string): string {
  return `${count} ${noun}${count === 1 ? '' : 's'}`;
}

/** '1st', '2nd', '11th', '23rd'. */
export function ordinal(value: number): string {
  const teens = value % 100 >= 11 && value % 100 <= 13;
  return `${value}${(!teens && { 1: 'st', 2: 'nd', 3: 'rd' }[value % 10]) || 'th'}`;
}

/** Counted from the front or the back: 2 is '2nd', -1 is 'last', -2 is '2nd to last'. */
export function placeWord(value: number): string {
  if (value === -1) return 'last';
  return value > 0 ? ordinal(value) : `${ordinal(-value)} to last`;
}

/** A day with its weekday: 'Thu 5 Jun 1997'. */
export function describeDay(day: CalendarDay): string {
  const number = numberOfDay(day);
  const { year, month, day: ofMonth } = partsOfNumber(number);
  const weekday = WEEKDAY_NAMES[weekdayIndex(number)]!.slice(0, 3);
  return `${weekday} ${ofMonth} ${MONTH_NAMES[month - 1]!.slice(0, 3)} ${year}`;
}

/** Engine hours inside a sentence, a whole number without its place: '100', '2.5'. */
export function roundHours(tenths: number): string {
  return formatTenths(tenths).replace(/\.0$/, '');
}
