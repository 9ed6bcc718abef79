import { type CalendarDay, partsOfDay, weekdayIndex, numberOfDay } from './calendar-day';
import type { Frequency, Recurrence } from './recurrence-parts';
import { MONTH_NAMES, WEEKDAY_NAMES, countOf, describeDay, joinWords, ordinal, placeWord } from './words';

const NOUNS: Record<Frequency, string> = { DAILY: 'day', WEEKLY: 'week', MONTHLY: 'month', YEARLY: 'year' };

function describeDays(rule: Recurrence): string[] {
  const within = rule.freq === 'MONTHLY' || rule.byMonth.length > 0 ? 'month' : 'year';
  const each = rule.freq === 'MONTHLY' || rule.freq === 'YEARLY' ? 'each ' : '';
  const names = rule.byDay.map(({ weekday, nth }) =>
    nth === null ? `${each}${WEEKDAY_NAMES[weekday]!}` : `the ${placeWord(nth)} ${WEEKDAY_NAMES[weekday]!}`,
  );
  const numbered = rule.byDay.some(({ nth }) => nth !== null);
  const places = (values: number[]) =>
    joinWords(
      values.map((value) => `the ${placeWord(value)} day`),
      'or',
    );
  return [
    rule.byDay.length ? `on ${joinWords(names)}${numbered ? ` of the ${within}` : ''}` : '',
    rule.byMonthDay.length ? `on ${places(rule.byMonthDay)} of the month` : '',
    rule.byYearDay.length ? `on ${places(rule.byYearDay)} of the year` : '',
    rule.byWeekNo.length ? `in week ${joinWords(rule.byWeekNo.map(String), 'or')} of the year` : '',
    rule.byMonth.length ? `in ${joinWords(rule.byMonth.map((month) => MONTH_NAMES[month - 1]!))}` : '',
  ].filter(Boolean);
}

/** What a rule takes from its start: '5 June', 'the 15th', 'Thursday'. */
function describeStart(rule: Recurrence, start: CalendarDay): string {
  const { month, day } = partsOfDay(start);
  if (rule.byDay.length || rule.byMonthDay.length || rule.byYearDay.length || rule.freq === 'DAILY')
    return '';
  if (rule.freq === 'WEEKLY') return `on ${WEEKDAY_NAMES[weekdayIndex(numberOfDay(start))]!}`;
  return rule.freq === 'YEARLY' && rule.byMonth.length === 0
    ? `on ${day} ${MONTH_NAMES[month - 1]!}`
    : `on the ${ordinal(day)}`;
}

/**
 * A rule in plain words: 'every 2 weeks on Tuesday and Sunday, 4 times in all'. What it takes from its start
 * is named unless the start is null.
 */
export function describeRecurrence(rule: Recurrence, start: CalendarDay | null): string {
  const noun = NOUNS[rule.freq];
  const every = rule.interval === 1 ? `every ${noun}` : `every ${rule.interval} ${noun}s`;
  const words = [every, start && describeStart(rule, start), ...describeDays(rule)].filter(Boolean).join(' ');
  const chosen = joinWords(
    rule.bySetPos.map((place) => `the ${placeWord(place)}`),
    'and',
  );
  return [
    words,
    chosen && `taking ${chosen} of these in each ${noun}`,
    rule.count !== null && (rule.count === 1 ? 'once' : `${countOf(rule.count, 'time')} in all`),
    rule.until !== null && `until ${describeDay(rule.until)}`,
  ]
    .filter(Boolean)
    .join(', ');
}
