import { WEEKDAYS, type Weekday } from '@/lib/domain/calendar-day';
import { MONTH_NAMES, WEEKDAY_NAMES } from '@/lib/domain/words';
import type { Dock } from '@/lib/schemas/dock';

/** The weekdays in order, each with its whole name. */
export const WEEKDAY_OPTIONS = WEEKDAYS.map((value, index) => ({
  value,
  label: WEEKDAY_NAMES[index] ?? value,
}));

const monthDay = (text: string) => {
  const [month = 1, day = 1] = text.split('-').map(Number);
  return `${day} ${MONTH_NAMES[month - 1]?.slice(0, 3) ?? ''}`;
};

/** The season in words: '15 May to 30 Sep', or 'all year'. */
export function seasonText(season: Dock['season']): string {
  return season ? `${monthDay(season.from)} to ${monthDay(season.to)}` : 'all year';
}

/** The opening weekdays in words: 'every day', 'Fri, Sat, Sun'. */
export function openText(weekdays: readonly Weekday[]): string {
  if (weekdays.length === WEEKDAYS.length) return 'every day';
  return WEEKDAY_OPTIONS.filter(({ value }) => weekdays.includes(value))
    .map(({ label }) => label.slice(0, 3))
    .join(', ');
}
