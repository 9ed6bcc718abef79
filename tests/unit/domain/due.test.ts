import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { addDays, isCalendarDay } from '@/lib/domain/calendar-day';
import {
  type Closing,
  DUE_STATES,
  type DuePoint,
  type History,
  computeDuePoint,
  computeDuePoints,
  computeFollowing,
  computeState,
  computeWorstState,
} from '@/lib/domain/due';
import type { CalendarTrigger, MeterTrigger, Trigger, Window } from '@/lib/domain/rule';

const lead = { tenths: 50, outings: 5, days: 7 };
const window: Window = {
  earlyTenths: 25,
  lateTenths: 50,
  earlyOutings: 2,
  lateOutings: 3,
  earlyDays: 3,
  lateDays: 5,
};
const schedule = { lead, window };
const closing = (on: string, engineHoursTenths = 0, outings = 0): Closing => ({
  on,
  engineHoursTenths,
  outings,
});
const history = (...closings: Closing[]): History => ({ enteredServiceOn: '2026-01-01', closings });

const calendar = (rrule: string, extra: Partial<CalendarTrigger> = {}): CalendarTrigger => ({
  on: 'calendar',
  rrule,
  start: '2026-01-01',
  anchor: 'scheduled',
  ...extra,
});
function dueOn(trigger: CalendarTrigger, closings: string[] = [], entered = '2026-01-01'): string | null {
  const point = computeDuePoint(trigger, schedule, {
    enteredServiceOn: entered,
    closings: closings.map((on) => closing(on)),
  });
  return point?.on === 'calendar' ? point.dueOn : null;
}

// Expectations are worked by hand with a calendar of 2026; the window is 3 days early to 5 days late.
describe('a calendar duty with no closing', () => {
  it('is due on its start, for a unit in service before', () => {
    expect(dueOn(calendar('FREQ=DAILY;INTERVAL=14'))).toBe('2026-01-01');
  });

  it('is due on the first occurrence after a unit enters service later', () => {
    expect(dueOn(calendar('FREQ=DAILY;INTERVAL=14'), [], '2026-01-16')).toBe('2026-01-29');
  });

  it('leaves out a month without its day while it is scheduled', () => {
    expect(dueOn(calendar('FREQ=MONTHLY', { start: '2026-01-31' }), [], '2026-02-01')).toBe('2026-03-31');
  });
});

describe('a duty of FREQ and INTERVAL alone', () => {
  const fortnightly = calendar('FREQ=DAILY;INTERVAL=14', { start: '2026-01-15' });

  it.each([
    ['2026-01-12', '2026-01-29', 'three days early is inside'],
    ['2026-01-15', '2026-01-29', 'on the day'],
    ['2026-01-20', '2026-01-29', 'five days late is inside'],
    ['2026-01-11', '2026-01-25', 'four days early starts again from the closing'],
    ['2026-01-21', '2026-02-04', 'six days late starts again from the closing'],
  ])('closed on %s is next due on %s: %s', (on, next) => {
    expect(dueOn(fortnightly, [on])).toBe(next);
  });

  it('started again from 31 January falls back to the last day of February, and returns to the 31st', () => {
    const monthly = calendar('FREQ=MONTHLY', { start: '2026-01-10' });
    expect(dueOn(monthly, ['2026-01-31'])).toBe('2026-02-28');
    expect(dueOn(monthly, ['2026-01-31', '2026-02-28'])).toBe('2026-03-31');
  });
});

describe('a duty with places in the calendar', () => {
  // First Mondays of 2026: 5 January, 2 February, 2 March, 6 April.
  const firstMonday = calendar('FREQ=MONTHLY;BYDAY=1MO');

  it.each([
    [['2026-01-01'], '2026-01-05', 'closed too early, it stays due'],
    [['2026-01-02'], '2026-02-02', 'closed three days early, inside'],
    [['2026-01-10'], '2026-02-02', 'closed five days late, inside'],
    [['2026-01-11'], '2026-02-02', 'closed too late, the first one after the closing'],
    [['2026-02-03'], '2026-03-02', 'closed so late that one was missed'],
    [['2026-02-02'], '2026-03-02', 'closed late on a later Monday, the one after that'],
    [['2026-01-01', '2026-01-05'], '2026-02-02', 'closed too early and again on the day'],
  ])('closed on %j is next due on %s: %s', (on, next) => {
    expect(dueOn(firstMonday, on)).toBe(next);
  });
});

describe('a duty counted from completion', () => {
  it('begins again on the day of the closing, however early or late', () => {
    const quarterly = calendar('FREQ=MONTHLY;INTERVAL=3', { anchor: 'completed' });
    expect(dueOn(quarterly, ['2026-05-20'])).toBe('2026-08-20');
    expect(dueOn(quarterly, ['2026-11-30'])).toBe('2027-02-28');
  });

  it('with places in the calendar takes the first after the closing', () => {
    const sundays = calendar('FREQ=WEEKLY;BYDAY=SU', { anchor: 'completed' });
    expect(dueOn(sundays, ['2026-03-01'])).toBe('2026-03-08');
    expect(dueOn(sundays, ['2026-03-03'])).toBe('2026-03-08');
  });
});

describe('a rule that ends', () => {
  it.each([
    ['scheduled and on time', calendar('FREQ=DAILY;INTERVAL=10;COUNT=3'), ['2026-01-01', '2026-01-11']],
    ['closed far too late', calendar('FREQ=DAILY;INTERVAL=10;COUNT=3'), ['2026-01-09', '2026-01-19']],
    [
      'counted from completion',
      calendar('FREQ=DAILY;INTERVAL=10;COUNT=3', { anchor: 'completed' }),
      ['2026-01-04', '2026-01-14'],
    ],
    [
      'with weekdays, counted from completion',
      calendar('FREQ=WEEKLY;BYDAY=TH;COUNT=3', { anchor: 'completed' }),
      ['2026-01-01', '2026-01-08'],
    ],
  ])('by COUNT=3 is due three times: %s', (_, trigger, twice) => {
    expect(dueOn(trigger, [])).not.toBeNull();
    expect(dueOn(trigger, twice.slice(0, 1))).not.toBeNull();
    const third = dueOn(trigger, twice);
    expect(third).not.toBeNull();
    expect(dueOn(trigger, [...twice, third!])).toBeNull();
    expect(dueOn(trigger, [...twice, third!, addDays(third!, 10)])).toBeNull();
  });

  it('by UNTIL is due no more after that day', () => {
    const spring = calendar('FREQ=WEEKLY;BYDAY=MO;UNTIL=20260112');
    expect(dueOn(spring, ['2026-01-05'])).toBe('2026-01-12');
    expect(dueOn(spring, ['2026-01-05', '2026-01-12'])).toBeNull();
  });

  it('is clear once it has ended', () => {
    expect(computeState(null, { engineHoursTenths: 1e6, outings: 1e6, today: '2999-01-01' })).toBe('clear');
  });

  it('with a rule that is not allowed throws, naming the part', () => {
    expect(() => dueOn(calendar('FREQ=HOURLY'))).toThrow(/FREQ/);
  });
});

describe('outings', () => {
  const every40: MeterTrigger = { on: 'outings', every: 40, anchor: 'scheduled' };

  it('have a window of their own: 38 to 43 around 40', () => {
    const next = (outings: number) =>
      computeDuePoint(every40, schedule, history(closing('2026-02-01', 9999, outings)));
    expect(next(37)).toMatchObject({ dueOutings: 77 });
    expect(next(38)).toMatchObject({ dueOutings: 80 });
    expect(next(43)).toMatchObject({ dueOutings: 80 });
    expect(next(44)).toMatchObject({ dueOutings: 84 });
  });

  it('have a lead and lateness of their own', () => {
    expect(computeDuePoint(every40, schedule, history())).toEqual({
      on: 'outings',
      dueOutings: 40,
      upcomingFromOutings: 35,
      overdueFromOutings: 43,
    });
  });
});

describe('state', () => {
  const at = (engineHoursTenths: number, today = '2026-01-01', outings = 0) => ({
    engineHoursTenths,
    outings,
    today,
  });

  it.each([
    [949, 'clear'],
    [950, 'upcoming'],
    [999, 'upcoming'],
    [1000, 'due'],
    [1049, 'due'],
    [1050, 'overdue'],
  ])('of a duty due at 100.0 h, 5.0 h ahead and 5.0 h late, at %s tenths is %s', (tenths, state) => {
    const point = computeDuePoint(
      { on: 'engine_hours', every: 1000, anchor: 'scheduled' },
      schedule,
      history(),
    );
    expect(computeState(point, at(tenths))).toBe(state);
  });

  it.each([
    ['2026-03-02', 'clear'],
    ['2026-03-03', 'upcoming'],
    ['2026-03-09', 'upcoming'],
    ['2026-03-10', 'due'],
    ['2026-03-15', 'due'],
    ['2026-03-16', 'overdue'],
  ])('of a duty due on 10 March, 7 days ahead and 5 days late, on %s is %s', (today, state) => {
    const point = computeDuePoint(calendar('FREQ=YEARLY', { start: '2026-03-10' }), schedule, history());
    expect(computeState(point, at(0, today))).toBe(state);
  });

  it('with nothing to run late goes from upcoming to overdue', () => {
    const strict = { lead, window: { ...window, lateTenths: 0 } };
    const point = computeDuePoint(
      { on: 'engine_hours', every: 1000, anchor: 'scheduled' },
      strict,
      history(),
    );
    expect(computeState(point, at(999))).toBe('upcoming');
    expect(computeState(point, at(1000))).toBe('overdue');
  });

  it('of a unit is the worst of its triggers, clear without any', () => {
    expect(computeWorstState(['upcoming', 'overdue', 'clear', 'due'])).toBe('overdue');
    expect(computeWorstState(['clear', 'due', 'upcoming'])).toBe('due');
    expect(computeWorstState([])).toBe('clear');
  });
});

describe('the points that follow', () => {
  it('of a meter step evenly from the due one', () => {
    const trigger: Trigger = { on: 'engine_hours', every: 1000, first: 200, anchor: 'scheduled' };
    expect(computeFollowing(trigger, schedule, history(closing('2026-01-02', 230)), 3)).toEqual([
      2200, 3200, 4200,
    ]);
  });

  it('of the last day of the month, counted from completion, stay on the shortest month passed', () => {
    const trigger = calendar('FREQ=MONTHLY', { start: '2026-01-31', anchor: 'completed' });
    expect(computeFollowing(trigger, schedule, history(), 3)).toEqual([
      '2026-02-28',
      '2026-03-28',
      '2026-04-28',
    ]);
  });

  it('end with the rule', () => {
    const trigger = calendar('FREQ=MONTHLY;COUNT=3');
    expect(computeFollowing(trigger, schedule, history(), 10)).toEqual(['2026-02-01', '2026-03-01']);
  });
});

const anchor = fc.constantFrom('scheduled' as const, 'completed' as const);
const day = fc.integer({ min: 0, max: 2000 }).map((days) => addDays('2026-01-01', days));
const anyWindow: fc.Arbitrary<Window> = fc.record({
  earlyTenths: fc.nat(60),
  lateTenths: fc.nat(60),
  earlyOutings: fc.nat(6),
  lateOutings: fc.nat(6),
  earlyDays: fc.nat(10),
  lateDays: fc.nat(10),
});
const meter: fc.Arbitrary<MeterTrigger> = fc.record(
  {
    on: fc.constantFrom('engine_hours' as const, 'outings' as const),
    every: fc.integer({ min: 1, max: 500 }),
    first: fc.integer({ min: 0, max: 500 }),
    anchor,
  },
  { requiredKeys: ['on', 'every', 'anchor'] },
);
const rrules = [
  'FREQ=DAILY;INTERVAL=14',
  'FREQ=WEEKLY;INTERVAL=2',
  'FREQ=MONTHLY',
  'FREQ=YEARLY',
  'FREQ=MONTHLY;COUNT=5',
  'FREQ=WEEKLY;BYDAY=MO,TH',
  'FREQ=MONTHLY;BYDAY=-1FR',
  'FREQ=MONTHLY;BYMONTHDAY=31',
  'FREQ=YEARLY;BYMONTH=4,10;BYDAY=1MO',
  'FREQ=MONTHLY;BYDAY=MO,TU,WE,TH,FR;BYSETPOS=-1;UNTIL=20300101',
];
const onCalendar: fc.Arbitrary<CalendarTrigger> = fc.record({
  on: fc.constant('calendar' as const),
  rrule: fc.constantFrom(...rrules),
  start: day,
  anchor,
});
/** Closings in the order they happened: none of the three ever goes back. */
const closings = fc
  .array(fc.record({ days: fc.nat(90), tenths: fc.nat(400), outings: fc.nat(60) }), { maxLength: 12 })
  .map((steps) => {
    let last = closing('2026-02-01');
    return steps.map(({ days, tenths, outings }) => {
      last = closing(addDays(last.on, days), last.engineHoursTenths + tenths, last.outings + outings);
      return last;
    });
  });
const due = (point: DuePoint | null): number | string => {
  if (!point) return '9999-12-31';
  return point.on === 'calendar' ? point.dueOn : point.on === 'outings' ? point.dueOutings : point.dueTenths;
};

describe('whatever the rule and its history', () => {
  it('computing again changes nothing, and no input is touched', () => {
    fc.assert(
      fc.property(fc.oneof(meter, onCalendar), anyWindow, closings, (trigger, anyway, done) => {
        const input = { triggers: [trigger], lead, window: anyway };
        const before = structuredClone([input, done]);
        const first = computeDuePoints(input, history(...done));
        expect(computeDuePoints(input, history(...done))).toEqual(first);
        expect([input, done]).toEqual(before);
      }),
    );
  });

  it('a closing at more hours never brings the next due hour nearer', () => {
    fc.assert(
      fc.property(
        meter,
        anyWindow,
        closings,
        fc.nat(300),
        fc.nat(300),
        (trigger, anyway, done, more, further) => {
          const last = done.at(-1) ?? closing('2026-02-01');
          const closedAfter = (extra: number) => {
            const final = closing(last.on, last.engineHoursTenths + extra, last.outings + extra);
            return computeDuePoint(trigger, { lead, window: anyway }, history(...done, final));
          };
          expect(due(closedAfter(more + further))).toBeGreaterThanOrEqual(Number(due(closedAfter(more))));
        },
      ),
    );
  });

  it('the next due point of a meter lies within one interval and the window after the closing', () => {
    fc.assert(
      fc.property(meter, anyWindow, closings, (trigger, anyway, done) => {
        fc.pre(done.length > 0);
        const last = done.at(-1)!;
        const at = trigger.on === 'outings' ? last.outings : last.engineHoursTenths;
        const early = trigger.on === 'outings' ? anyway.earlyOutings : anyway.earlyTenths;
        const late = trigger.on === 'outings' ? anyway.lateOutings : anyway.lateTenths;
        const next = Number(due(computeDuePoint(trigger, { lead, window: anyway }, history(...done))));
        expect(next).toBeGreaterThanOrEqual(at + trigger.every - late);
        expect(next).toBeLessThanOrEqual(at + trigger.every + early);
      }),
    );
  });

  it('a closing on the due day moves the due day on, or ends the rule', () => {
    fc.assert(
      fc.property(onCalendar, anyWindow, closings, (trigger, anyway, done) => {
        const point = computeDuePoint(trigger, { lead, window: anyway }, history(...done));
        fc.pre(point?.on === 'calendar');
        const on = String(due(point));
        const next = computeDuePoint(trigger, { lead, window: anyway }, history(...done, closing(on)));
        expect(String(due(next)) > on).toBe(true);
        expect(isCalendarDay(String(due(next)))).toBe(true);
      }),
    );
  });

  it('following points are those that closing each when due would give', () => {
    fc.assert(
      fc.property(fc.oneof(meter, onCalendar), anyWindow, closings, (trigger, anyway, done) => {
        const all = [...done];
        const walked: (number | string)[] = [];
        for (let step = 0; step < 4; step++) {
          const point = computeDuePoint(trigger, { lead, window: anyway }, history(...all));
          if (!point) break;
          const at = due(point);
          walked.push(at);
          all.push(typeof at === 'string' ? closing(at) : closing('2026-02-01', at, at));
        }
        const following = computeFollowing(trigger, { window: anyway }, history(...done), 3);
        expect(following).toEqual(walked.slice(1));
      }),
    );
  });

  it('more hours, outings or days never make a state better', () => {
    fc.assert(
      fc.property(
        fc.oneof(meter, onCalendar),
        anyWindow,
        closings,
        fc.nat(9000),
        fc.nat(900),
        day,
        fc.nat(400),
        (trigger, anyway, done, tenths, outings, today, more) => {
          const point = computeDuePoint(trigger, { lead, window: anyway }, history(...done));
          const before = computeState(point, { engineHoursTenths: tenths, outings, today });
          const after = computeState(point, {
            engineHoursTenths: tenths + more,
            outings: outings + more,
            today: addDays(today, more),
          });
          expect(DUE_STATES.indexOf(after)).toBeGreaterThanOrEqual(DUE_STATES.indexOf(before));
        },
      ),
    );
  });
});
