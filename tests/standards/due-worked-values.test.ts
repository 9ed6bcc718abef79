/**
 * Worked values of due points from publications outside this project, each with its source. "Seen" means read
 * in the source's text when the table of values was drawn up; "quoted" means read in another's quotation.
 */
import { describe, expect, it } from 'vitest';
import {
  type Closing,
  type Standing,
  computeDuePoint,
  computeDuePoints,
  computeState,
} from '@/lib/domain/due';
import type { Schedule, Trigger, Window } from '@/lib/domain/rule';

const noLead = { tenths: 0, outings: 0, days: 0 };
const noWindow: Window = {
  earlyTenths: 0,
  lateTenths: 0,
  earlyOutings: 0,
  lateOutings: 0,
  earlyDays: 0,
  lateDays: 0,
};
const hours = (value: number) => Math.round(value * 10);
const closedAt = (value: number, on = '1999-07-30'): Closing => ({
  on,
  engineHoursTenths: hours(value),
  outings: 0,
});
const entered = '1990-01-01';

function dueHours(trigger: Trigger, window: Partial<Window>, closings: Closing[]): number {
  const schedule = { lead: noLead, window: { ...noWindow, ...window } };
  const point = computeDuePoint(trigger, schedule, { enteredServiceOn: entered, closings });
  if (point?.on !== 'engine_hours') throw new Error('no due hour');
  return point.dueTenths / 10;
}

describe('US Army TM 1-1500-328-23, 30 July 1999 (seen): inspections every 25 h, 10 % either way', () => {
  const trigger: Trigger = { on: 'engine_hours', every: 250, first: 14_727, anchor: 'scheduled' };
  const window = { earlyTenths: 25, lateTenths: 25 };

  it.each([1470.2, 1471, 1472.7, 1474.9, 1475.2])(
    'due 1472.7, closed at %s inside 1470.2 to 1475.2: next 1497.7',
    (at) => {
      expect(dueHours(trigger, window, [closedAt(at)])).toBe(1497.7);
    },
  );

  it.each([
    [1470.1, 1495.1],
    [1475.3, 1500.3],
  ])('closed at %s, a tenth outside: next %s, counted from the closing', (at, next) => {
    expect(dueHours(trigger, window, [closedAt(at)])).toBe(next);
  });

  it('is overdue from the end of the window, 1475.2 h', () => {
    const [point] = computeDuePoints(
      { triggers: [trigger], lead: noLead, window: { ...noWindow, ...window } },
      { enteredServiceOn: entered, closings: [] },
    );
    const at = (value: number): Standing => ({
      engineHoursTenths: hours(value),
      outings: 0,
      today: '1999-07-30',
    });
    expect(computeState(point!, at(1472.6))).toBe('clear');
    expect(computeState(point!, at(1472.7))).toBe('due');
    expect(computeState(point!, at(1475.1))).toBe('due');
    expect(computeState(point!, at(1475.2))).toBe('overdue');
  });
});

describe('US Army TM 1-1500-328-23 (seen): every 50 h, 5 h either way, due 1306.4', () => {
  it('closed at 1299.9, outside: next 1349.9', () => {
    const trigger: Trigger = { on: 'engine_hours', every: 500, first: 13_064, anchor: 'scheduled' };
    expect(dueHours(trigger, { earlyTenths: 50, lateTenths: 50 }, [closedAt(1299.9)])).toBe(1349.9);
  });
});

describe('US Army TM 1-1500-328-23 (seen): every 14 days or 10 h, whichever comes first', () => {
  const schedule: Schedule = {
    triggers: [
      { on: 'calendar', rrule: 'FREQ=DAILY;INTERVAL=14', start: '1997-05-08', anchor: 'completed' },
      { on: 'engine_hours', every: 100, anchor: 'completed' },
    ],
    lead: noLead,
    window: noWindow,
  };
  const last = closedAt(1709, '1997-05-22');

  it('last closed on 22 May 1997 at 1709 h: due on 5 June 1997 or at 1719 h', () => {
    expect(computeDuePoints(schedule, { enteredServiceOn: entered, closings: [last] })).toMatchObject([
      { on: 'calendar', dueOn: '1997-06-05' },
      { on: 'engine_hours', dueTenths: 17_190 },
    ]);
  });

  it('gives the same when scheduled and closed on the due day', () => {
    const triggers = schedule.triggers.map((trigger): Trigger => ({ ...trigger, anchor: 'scheduled' }));
    expect(
      computeDuePoints({ ...schedule, triggers }, { enteredServiceOn: '1997-05-22', closings: [last] }),
    ).toMatchObject([{ dueOn: '1997-06-05' }, { dueTenths: 17_190 }]);
  });
});

describe('14 CFR 91.409(b) (seen): every 100 h, exceeded by not more than 10 h', () => {
  const trigger: Trigger = { on: 'engine_hours', every: 1000, first: 6500, anchor: 'scheduled' };

  it('due 650, closed at 658: next 750, the excess counts into the next 100 hours', () => {
    expect(dueHours(trigger, { lateTenths: 100 }, [closedAt(658)])).toBe(750);
  });

  it('no early closing is provided for: closed at 640, next 740', () => {
    expect(dueHours(trigger, { lateTenths: 100 }, [closedAt(640)])).toBe(740);
  });
});

describe('AMC ML.A.302(d) (quoted), read literally', () => {
  it('every 100 h counted from completion, closed at 2010: next 2110', () => {
    const trigger: Trigger = { on: 'engine_hours', every: 1000, first: 20_000, anchor: 'completed' };
    expect(dueHours(trigger, { lateTenths: 100 }, [closedAt(2010)])).toBe(2110);
  });
});

describe('RFC 7529 section 4.1 (quoted), SKIP=BACKWARD', () => {
  const yearly: Trigger = { on: 'calendar', rrule: 'FREQ=YEARLY', start: '2012-02-29', anchor: 'completed' };
  const schedule = { lead: noLead, window: noWindow };

  it('yearly from 29 February 2012, done that day: next on 28 February 2013', () => {
    const history = { enteredServiceOn: '2012-01-01', closings: [closedAt(1, '2012-02-29')] };
    expect(computeDuePoint(yearly, schedule, history)).toMatchObject({ dueOn: '2013-02-28' });
  });

  it('yearly from 29 February 2012, for a unit that entered service in March: 28 February 2013', () => {
    const history = { enteredServiceOn: '2012-03-01', closings: [] };
    expect(computeDuePoint(yearly, schedule, history)).toMatchObject({ dueOn: '2013-02-28' });
  });
});

describe('DA PAM 750-8 (seen as quoted in PS Magazine, 18 December 2019)', () => {
  it('beyond the variance an item is not available; with 3 days, worked by hand: overdue on the fourth', () => {
    const trigger: Trigger = {
      on: 'calendar',
      rrule: 'FREQ=DAILY;INTERVAL=30',
      start: '2019-12-01',
      anchor: 'scheduled',
    };
    const point = computeDuePoint(
      trigger,
      { lead: noLead, window: { ...noWindow, lateDays: 3 } },
      { enteredServiceOn: '2019-12-01', closings: [] },
    );
    const on = (today: string): Standing => ({ engineHoursTenths: 0, outings: 0, today });
    expect(computeState(point, on('2019-12-04'))).toBe('due');
    expect(computeState(point, on('2019-12-05'))).toBe('overdue');
  });
});
