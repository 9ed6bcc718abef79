import { WEEKDAYS, type Weekday } from '@/lib/domain/calendar-day';
import { parseRecurrence } from '@/lib/domain/recurrence';
import type { Frequency, Recurrence } from '@/lib/domain/recurrence-parts';

/** How a calendar trigger is put together on the form: three common ways, and the rule's own text for the rest. */
export type CalendarDraft = {
  way: 'step' | 'weekdays' | 'month_day' | 'text';
  interval: string;
  frequency: Frequency;
  weekdays: Weekday[];
  /** 1 to 31, or -1 for the last day. */
  monthDay: string;
  text: string;
};

export const NEW_CALENDAR: CalendarDraft = {
  way: 'step',
  interval: '1',
  frequency: 'YEARLY',
  weekdays: ['MO'],
  monthDay: '1',
  text: 'FREQ=MONTHLY;BYDAY=1MO',
};

/** The recurrence rule that a draft stands for. */
export function toRrule(draft: CalendarDraft): string {
  const every = draft.interval.trim() === '1' ? '' : `;INTERVAL=${draft.interval.trim() || '?'}`;
  switch (draft.way) {
    case 'step':
      return `FREQ=${draft.frequency}${every}`;
    case 'weekdays':
      return `FREQ=WEEKLY${every};BYDAY=${WEEKDAYS.filter((day) => draft.weekdays.includes(day)).join(',')}`;
    case 'month_day':
      return `FREQ=MONTHLY${every};BYMONTHDAY=${draft.monthDay}`;
    case 'text':
      return draft.text.trim();
  }
}

const isBare = (rule: Recurrence, but: keyof Recurrence) =>
  rule.count === null &&
  rule.until === null &&
  (['byMonth', 'byWeekNo', 'byYearDay', 'byMonthDay', 'byDay', 'bySetPos'] as const).every(
    (part) => part === but || rule[part].length === 0,
  );

/** The draft that shows a recurrence rule: one of the common ways where it is one, its text otherwise. */
export function fromRrule(text: string): CalendarDraft {
  const asText: CalendarDraft = { ...NEW_CALENDAR, way: 'text', text };
  const parsed = parseRecurrence(text);
  if (!parsed.ok) return asText;
  const rule = parsed.recurrence;
  const draft = { ...asText, interval: String(rule.interval), frequency: rule.freq };
  const candidates: CalendarDraft[] = [];
  if (isBare(rule, 'freq')) candidates.push({ ...draft, way: 'step' });
  if (rule.freq === 'WEEKLY' && isBare(rule, 'byDay'))
    candidates.push({ ...draft, way: 'weekdays', weekdays: rule.byDay.map((day) => WEEKDAYS[day.weekday]!) });
  if (rule.freq === 'MONTHLY' && rule.byMonthDay.length === 1 && isBare(rule, 'byMonthDay'))
    candidates.push({ ...draft, way: 'month_day', monthDay: String(rule.byMonthDay[0]) });
  // Only a way that says exactly the same: a week that begins on another day, for one, is left as text.
  return candidates.find((candidate) => sameRule(toRrule(candidate), rule)) ?? asText;
}

function sameRule(text: string, rule: Recurrence): boolean {
  const parsed = parseRecurrence(text);
  return parsed.ok && JSON.stringify(parsed.recurrence) === JSON.stringify(rule);
}
