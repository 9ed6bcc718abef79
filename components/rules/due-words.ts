import { describeDay } from '@/lib/domain/words';
import type { Left } from '@/lib/schemas/due-point';
import type { Due } from '@/lib/schemas/rule';

const counted = (count: number, one: string) =>
  `${count.toLocaleString('en')} ${count === 1 ? one : `${one}s`}`;

/** Where something is due: '1,497.7 h', '80 outings' or 'Thu 5 Jun 1997'. */
export function dueText(due: Due): string {
  if ('date' in due) return describeDay(due.date);
  return 'hours' in due ? hoursText(due.hours) : counted(due.outings, 'outing');
}

/** Decimal hours with one place and the unit. */
export function hoursText(hours: number): string {
  return `${hours.toLocaleString('en', { minimumFractionDigits: 1, maximumFractionDigits: 1 })} h`;
}

/** What is left before a point, or how far past it: '10.5 h left', '3 days past'. */
export function leftText(left: Left): string {
  const amount = 'hours' in left ? left.hours : 'outings' in left ? left.outings : left.days;
  const size = Math.abs(amount);
  const text =
    'hours' in left ? hoursText(size) : 'outings' in left ? counted(size, 'outing') : counted(size, 'day');
  return `${text} ${amount < 0 ? 'past' : 'left'}`;
}

/** Minutes of work: '45 min', '2 h', '2 h 30 min'. */
export function minutesText(minutes: number): string {
  const [hours, rest] = [Math.floor(minutes / 60), minutes % 60];
  if (hours === 0) return `${rest} min`;
  return rest === 0 ? `${hours} h` : `${hours} h ${rest} min`;
}

/** What a trigger counts, as a heading. */
export const TRIGGER_WORDS = {
  engine_hours: 'Engine hours',
  outings: 'Outings',
  calendar: 'Calendar',
} as const;

export const KIND_WORDS = { inspection: 'Inspection', service: 'Service', rebuild: 'Rebuild' } as const;
