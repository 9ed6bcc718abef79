import { partsOfDay } from './calendar-day';
import { isPlain, parseRecurrence } from './recurrence';
import { describeRecurrence } from './recurrence-words';
import type { CalendarTrigger, Schedule, Trigger } from './rule';
import { countOf, describeDay, joinWords, roundHours } from './words';

const capitalised = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

function describeCalendar({ rrule, start, anchor }: CalendarTrigger): string {
  const parsed = parseRecurrence(rrule);
  if (!parsed.ok) return `${parsed.reason}.`;
  const { recurrence } = parsed;
  const steps = isPlain(recurrence) && (recurrence.freq === 'MONTHLY' || recurrence.freq === 'YEARLY');
  const missing = !steps || partsOfDay(start).day <= 28 ? '' : ', left out where that day is missing';
  const from = describeDay(start);
  if (anchor === 'completed' && isPlain(recurrence)) {
    const every = capitalised(describeRecurrence(recurrence, null));
    return `${every}, first on ${from}, counted from the date it was done.`;
  }
  const every = capitalised(describeRecurrence(recurrence, start));
  return anchor === 'scheduled'
    ? `${every}${missing}, from ${from}, counted from the date it was due.`
    : `${every}, from ${from}, next on the first such date after it was done.`;
}

function describeTrigger(trigger: Trigger): string {
  if (trigger.on === 'calendar') return describeCalendar(trigger);
  const counted = trigger.anchor === 'scheduled' ? 'was due' : 'was done';
  if (trigger.on === 'outings') {
    const first = trigger.first === undefined ? '' : `, first at ${countOf(trigger.first, 'outing')}`;
    return `Every ${countOf(trigger.every, 'outing')}${first}, counted from the outing at which it ${counted}.`;
  }
  const first = trigger.first === undefined ? '' : `, first at ${roundHours(trigger.first)} h`;
  return `Every ${roundHours(trigger.every)} engine hours${first}, counted from the hour it ${counted}.`;
}

type Amounts = { tenths: number; outings: number; days: number };

/** Only of what the rule counts: '10 h or 3 days', or nothing when all are 0. */
function describeAmounts({ triggers }: Schedule, { tenths, outings, days }: Amounts): string {
  const counts = (on: Trigger['on']) => triggers.some((trigger) => trigger.on === on);
  const words = [
    counts('engine_hours') && tenths > 0 && `${roundHours(tenths)} h`,
    counts('outings') && outings > 0 && countOf(outings, 'outing'),
    counts('calendar') && days > 0 && countOf(days, 'day'),
  ];
  return joinWords(
    words.filter((word) => word !== false),
    'or',
  );
}

/** Whether a closing outside the window moves the next due point: a rule that names calendar places keeps them. */
function isMovable(trigger: Trigger): boolean {
  if (trigger.anchor === 'completed') return false;
  if (trigger.on !== 'calendar') return true;
  const parsed = parseRecurrence(trigger.rrule);
  return parsed.ok && isPlain(parsed.recurrence);
}

function describeWindow(schedule: Schedule): string {
  const { window, triggers } = schedule;
  const early = describeAmounts(schedule, {
    tenths: window.earlyTenths,
    outings: window.earlyOutings,
    days: window.earlyDays,
  });
  const late = describeAmounts(schedule, {
    tenths: window.lateTenths,
    outings: window.lateOutings,
    days: window.lateDays,
  });
  const allowed = [early && `up to ${early} early`, late && `up to ${late} late`]
    .filter(Boolean)
    .join(' and ');
  const may = allowed ? `It may be done ${allowed}.` : 'It may be done neither early nor late.';
  return triggers.some(isMovable)
    ? `${may} Done outside that, the next is counted from when it was done.`
    : may;
}

/** The point at which lateness begins to hold: meters at the allowance itself, days on the day after it. */
function describeHolding({ triggers, window }: Schedule): string {
  const { lateTenths, lateOutings, lateDays } = window;
  const words: Record<Trigger['on'], string> = {
    engine_hours: lateTenths > 0 ? `at ${roundHours(lateTenths)} h past due` : 'at the due hour',
    outings: lateOutings > 0 ? `at ${countOf(lateOutings, 'outing')} past due` : 'at the due outing',
    calendar: lateDays > 0 ? `more than ${countOf(lateDays, 'day')} past due` : 'on the day after it is due',
  };
  const points = [...new Set(triggers.map(({ on }) => words[on]))];
  return `${capitalised(joinWords(points, 'or'))}, it holds the unit until it is done.`;
}

/**
 * What a rule means, in plain English sentences: one for each trigger, how they go together, the window, the
 * lead, and what lateness does. A recurrence rule that is not allowed is answered by the reason.
 */
export function describeRule(schedule: Schedule, { holdsUnit }: { holdsUnit: boolean }): string[] {
  const { triggers, lead } = schedule;
  if (triggers.length === 0) return [];
  const ahead = describeAmounts(schedule, lead);
  return [
    ...triggers.map(describeTrigger),
    ...(triggers.length > 1 ? ['Whichever comes first is due, and doing it once answers all of them.'] : []),
    describeWindow(schedule),
    ...(ahead ? [`It shows as upcoming from ${ahead} before.`] : []),
    holdsUnit ? describeHolding(schedule) : 'Being late does not hold the unit.',
  ];
}
