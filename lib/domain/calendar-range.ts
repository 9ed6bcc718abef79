import {
  type CalendarDay,
  addDays,
  daysInMonth,
  numberOfDay,
  partsOfDay,
  weekdayIndex,
} from './calendar-day';

/** A month as a grid of whole weeks, a week, or a month as a list. */
export type CalendarView = 'month' | 'week' | 'list';
export const CALENDAR_VIEWS: readonly CalendarView[] = ['month', 'week', 'list'];

const monday = (day: CalendarDay) => addDays(day, -weekdayIndex(numberOfDay(day)));
const firstOfMonth = (day: CalendarDay) => `${day.slice(0, 8)}01`;

/** The days a view shows around a day, both ends included; weeks begin on Monday, a month's grid has six of them. */
export function computeRange(view: CalendarView, day: CalendarDay): { from: CalendarDay; to: CalendarDay } {
  if (view === 'week') return { from: monday(day), to: addDays(monday(day), 6) };
  const first = firstOfMonth(day);
  if (view === 'month') return { from: monday(first), to: addDays(monday(first), 41) };
  const { year, month } = partsOfDay(day);
  return { from: first, to: addDays(first, daysInMonth(year, month) - 1) };
}

/** The day a view goes to from a day: the same weekday a week on or back, or the first of the month beside it. */
export function computeStep(view: CalendarView, day: CalendarDay, step: 1 | -1): CalendarDay {
  if (view === 'week') return addDays(day, 7 * step);
  const first = firstOfMonth(day);
  return step === 1 ? firstOfMonth(addDays(first, 31)) : firstOfMonth(addDays(first, -1));
}
