import { describe, expect, it } from 'vitest';
import type { CalendarTrigger, Lead, Schedule, Trigger, Window } from '@/lib/domain/rule';
import { describeRule } from '@/lib/domain/rule-words';

const noLead: Lead = { tenths: 0, outings: 0, days: 0 };
const noWindow: Window = {
  earlyTenths: 0,
  lateTenths: 0,
  earlyOutings: 0,
  lateOutings: 0,
  earlyDays: 0,
  lateDays: 0,
};
const words = (
  triggers: Trigger[],
  window: Partial<Window> = {},
  lead: Partial<Lead> = {},
  holdsUnit = true,
) => {
  const schedule: Schedule = { triggers, lead: { ...noLead, ...lead }, window: { ...noWindow, ...window } };
  return describeRule(schedule, { holdsUnit });
};
const hours: Trigger = { on: 'engine_hours', every: 1000, anchor: 'scheduled' };
const calendar = (rrule: string, anchor: CalendarTrigger['anchor'] = 'scheduled', start = '2026-01-31') =>
  words([{ on: 'calendar', rrule, start, anchor }])[0];

describe('what a rule means', () => {
  it('is said for engine hours with a late allowance', () => {
    expect(words([hours], { lateTenths: 100 }, { tenths: 205 })).toEqual([
      'Every 100 engine hours, counted from the hour it was due.',
      'It may be done up to 10 h late. Done outside that, the next is counted from when it was done.',
      'It shows as upcoming from 20.5 h before.',
      'At 10 h past due, it holds the unit until it is done.',
    ]);
  });

  it('is said for outings counted from completion that do not hold', () => {
    expect(words([{ on: 'outings', every: 40, first: 10, anchor: 'completed' }], {}, {}, false)).toEqual([
      'Every 40 outings, first at 10 outings, counted from the outing at which it was done.',
      'It may be done neither early nor late.',
      'Being late does not hold the unit.',
    ]);
  });

  it('is said for whichever comes first, with the amounts of what it counts and no others', () => {
    const monthly: Trigger = {
      on: 'calendar',
      rrule: 'FREQ=MONTHLY',
      start: '2026-01-15',
      anchor: 'scheduled',
    };
    expect(
      words(
        [hours, monthly],
        { earlyTenths: 100, lateTenths: 50, lateDays: 1, lateOutings: 9 },
        { tenths: 100, days: 7 },
      ),
    ).toEqual([
      'Every 100 engine hours, counted from the hour it was due.',
      'Every month on the 15th, from Thu 15 Jan 2026, counted from the date it was due.',
      'Whichever comes first is due, and doing it once answers all of them.',
      'It may be done up to 10 h early and up to 5 h or 1 day late. Done outside that, the next is counted from when it was done.',
      'It shows as upcoming from 10 h or 7 days before.',
      'At 5 h past due or more than 1 day past due, it holds the unit until it is done.',
    ]);
  });

  it('says that nothing is left to run without a late allowance', () => {
    expect(words([hours]).at(-1)).toBe('At the due hour, it holds the unit until it is done.');
  });

  it('is nothing for a rule without triggers', () => {
    expect(words([])).toEqual([]);
  });
});

describe('a calendar duty in words', () => {
  it.each([
    ['FREQ=DAILY;INTERVAL=14', 'Every 14 days'],
    ['FREQ=WEEKLY', 'Every week on Saturday'],
    ['FREQ=WEEKLY;INTERVAL=2;BYDAY=TU,SU', 'Every 2 weeks on Tuesday and Sunday'],
    ['FREQ=MONTHLY', 'Every month on the 31st, left out where that day is missing'],
    ['FREQ=MONTHLY;BYDAY=1MO,-1FR', 'Every month on the 1st Monday and the last Friday of the month'],
    ['FREQ=MONTHLY;BYMONTHDAY=15,-1', 'Every month on the 15th day or the last day of the month'],
    [
      'FREQ=YEARLY;BYMONTH=4,10;BYDAY=2SA',
      'Every year on the 2nd Saturday of the month in April and October',
    ],
    ['FREQ=YEARLY;BYDAY=20MO', 'Every year on the 20th Monday of the year'],
    ['FREQ=YEARLY;BYYEARDAY=100,-2', 'Every year on the 100th day or the 2nd to last day of the year'],
    ['FREQ=YEARLY;BYWEEKNO=20;BYDAY=MO', 'Every year on each Monday in week 20 of the year'],
    [
      'FREQ=MONTHLY;BYDAY=MO,FR;BYSETPOS=-1',
      'Every month on each Monday and each Friday, taking the last of these in each month',
    ],
    ['FREQ=DAILY;COUNT=1', 'Every day, once'],
    ['FREQ=DAILY;COUNT=12', 'Every day, 12 times in all'],
    ['FREQ=DAILY;UNTIL=20261231', 'Every day, until Thu 31 Dec 2026'],
  ])('%s: %s', (rrule, said) => {
    expect(calendar(rrule)).toBe(`${said}, from Sat 31 Jan 2026, counted from the date it was due.`);
  });

  it('counted from completion says so', () => {
    expect(calendar('FREQ=MONTHLY;INTERVAL=6', 'completed')).toBe(
      'Every 6 months, first on Sat 31 Jan 2026, counted from the date it was done.',
    );
    expect(calendar('FREQ=MONTHLY;BYDAY=1MO', 'completed')).toBe(
      'Every month on the 1st Monday of the month, from Sat 31 Jan 2026, next on the first such date after it was done.',
    );
  });

  it('that is not allowed is answered by the reason', () => {
    expect(calendar('FREQ=HOURLY')).toBe('FREQ must be DAILY, WEEKLY, MONTHLY or YEARLY.');
  });

  it('with places in the calendar does not claim to move with the closing', () => {
    const [, window] = words([
      { on: 'calendar', rrule: 'FREQ=MONTHLY;BYDAY=1MO', start: '2026-01-05', anchor: 'scheduled' },
    ]);
    expect(window).toBe('It may be done neither early nor late.');
  });
});
