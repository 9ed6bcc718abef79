/**
 * A slow judge of due points and readiness, written from the rules alone and apart from the code it judges: it
 * replays every closing, and walks the calendar one day after the other. Hours are whole tenths.
 */

export type OracleTrigger =
  | { on: 'hours' | 'outings'; every: number; first?: number; anchor: 'scheduled' | 'completed' }
  | { on: 'calendar'; rrule: string; start: string; anchor: 'scheduled' | 'completed' };
export type Slack = { hours: number; outings: number; days: number };
export type OracleRule = {
  triggers: OracleTrigger[];
  lead: Slack;
  early: Slack;
  late: Slack;
  holds: boolean;
};
export type OracleClosing = { on: string; hours: number; outings: number };

/** A due point with the first hour, outing or day at which it is upcoming and overdue; days are day numbers. */
export type OraclePoint = { due: number; upcomingFrom: number; overdueFrom: number };

const DAY_MS = 86_400_000;
export const toNumber = (day: string): number => Date.parse(`${day}T00:00:00Z`) / DAY_MS;
export const toDay = (number: number): string => new Date(number * DAY_MS).toISOString().slice(0, 10);

const WEEKDAYS = ['SU', 'MO', 'TU', 'WE', 'TH', 'FR', 'SA'];

function readDay(number: number) {
  const date = new Date(number * DAY_MS);
  const [year, month, day] = [date.getUTCFullYear(), date.getUTCMonth(), date.getUTCDate()];
  const length = new Date(Date.UTC(year, month + 1, 0)).getUTCDate();
  return { year, month, day, length, weekday: WEEKDAYS[date.getUTCDay()]! };
}

/** Monday of the week of a day, as a day number. */
function mondayOf(number: number): number {
  let monday = number;
  while (readDay(monday).weekday !== 'MO') monday -= 1;
  return monday;
}

/**
 * Whether a day is an occurrence of a rule (RFC 5545: FREQ, INTERVAL, weekly BYDAY, one BYMONTHDAY, one BYMONTH) that
 * began on `start`. `backward`: a month that has no such day takes its last one (RFC 7529, SKIP=BACKWARD).
 */
function occurs(rrule: string, start: number, number: number, backward: boolean): boolean {
  const parts = Object.fromEntries(rrule.split(';').map((part) => part.split('='))) as Record<string, string>;
  const interval = Number(parts.INTERVAL ?? 1);
  if (number < start) return false;
  if (parts.FREQ === 'DAILY') return (number - start) % interval === 0;
  if (parts.FREQ === 'WEEKLY') {
    const weeks = (mondayOf(number) - mondayOf(start)) / 7;
    const days = parts.BYDAY?.split(',') ?? [readDay(start).weekday];
    return weeks % interval === 0 && days.includes(readDay(number).weekday);
  }
  const [from, at] = [readDay(start), readDay(number)];
  const months = (at.year - from.year) * 12 + at.month - from.month;
  if (parts.FREQ === 'YEARLY' && parts.BYMONTH) {
    const inYear = at.month + 1 === Number(parts.BYMONTH) && at.day === Number(parts.BYMONTHDAY);
    return inYear && (at.year - from.year) % interval === 0;
  }
  if (months % (parts.FREQ === 'YEARLY' ? 12 * interval : interval) !== 0) return false;
  if (parts.BYMONTHDAY) return at.day === Number(parts.BYMONTHDAY);
  return at.day === from.day || (backward && from.day > at.length && at.day === at.length);
}

function firstFrom(rrule: string, start: number, from: number, backward: boolean): number {
  for (let number = from; number < from + 40_000; number += 1)
    if (occurs(rrule, start, number, backward)) return number;
  throw new Error(`${rrule} has no day from ${toDay(from)} on`);
}

type CalendarTrigger = Extract<OracleTrigger, { on: 'calendar' }>;

function dueDay(
  rule: OracleRule,
  trigger: CalendarTrigger,
  entered: string,
  closings: OracleClosing[],
): number {
  const { rrule } = trigger;
  const keepsPlaces = rrule.includes(';BY');
  let start = toNumber(trigger.start);
  let backward = trigger.anchor === 'completed';
  let due = firstFrom(rrule, start, Math.max(start, toNumber(entered)), backward);
  for (const closing of closings) {
    const closed = toNumber(closing.on);
    const tooEarly = closed < due - rule.early.days;
    const tooLate = closed > due + rule.late.days;
    if (trigger.anchor === 'completed' || ((tooEarly || tooLate) && !keepsPlaces)) {
      [start, backward] = [closed, true];
      due = firstFrom(rrule, start, closed + 1, backward);
    } else if (tooLate) due = firstFrom(rrule, start, closed + 1, backward);
    else if (!tooEarly) due = firstFrom(rrule, start, due + 1, backward);
  }
  return due;
}

/** Where one trigger of a rule is due on a unit that entered service on a day and has these closings, in order. */
export function judgeDue(
  rule: OracleRule,
  trigger: OracleTrigger,
  entered: string,
  closings: OracleClosing[],
): OraclePoint {
  if (trigger.on === 'calendar') {
    const due = dueDay(rule, trigger, entered, closings);
    return { due, upcomingFrom: due - rule.lead.days, overdueFrom: due + rule.late.days + 1 };
  }
  const { on, every } = trigger;
  let due = trigger.first ?? every;
  for (const closing of closings) {
    const inside = closing[on] >= due - rule.early[on] && closing[on] <= due + rule.late[on];
    if (trigger.anchor === 'scheduled' && inside) due = due + every;
    else due = closing[on] + every;
  }
  return { due, upcomingFrom: due - rule.lead[on], overdueFrom: due + rule.late[on] };
}

/** What of a unit a trigger is held against. */
export function meterOf(
  trigger: OracleTrigger,
  unit: { hours: number; outings: number },
  today: string,
): number {
  return trigger.on === 'calendar' ? toNumber(today) : unit[trigger.on];
}
