import { beforeAll, describe, expect, test } from 'vitest';
import { testDatabase } from '../support/database';
import { testApi, type Caller } from '../support/http';

const database = testDatabase({ keep: true });
const api = testApi(database);
let hand: Caller;
beforeAll(async () => {
  hand = await api.caller('dock');
});

const unit = { enteredServiceOn: '1997-01-01', engineHours: 1450, outings: 0 };
const closed = (engineHours: number, on = '1999-07-30') => ({ on, engineHours, outings: 0 });
const preview = (body: object) =>
  hand.send('POST', '/rules/preview', { unit, closings: [], today: '1999-07-30', count: 0, ...body });

describe('the worked values of the handbooks', () => {
  test('every 25 h, 2.5 h early and late, due at 1472.7 h: inside the window, next at 1497.7 h (TM 1-1500-328-23)', async () => {
    const rule = {
      triggers: [{ on: 'engine_hours', every: 25, first: 1472.7 }],
      window: { earlyHours: 2.5, lateHours: 2.5 },
    };
    expect((await preview(rule)).body).toEqual({
      triggers: [{ index: 0, due: { hours: 1472.7 }, state: 'clear', following: [] }],
      state: 'clear',
    });
    // The window is 1470.2 h to 1475.2 h, both included; a tenth past either end it is left.
    for (const [at, next] of [
      [1470.2, 1497.7],
      [1475.2, 1497.7],
      [1470.1, 1495.1],
      [1475.3, 1500.3],
    ] as const)
      expect((await preview({ ...rule, closings: [closed(at)] })).body).toMatchObject({
        triggers: [{ due: { hours: next } }],
      });
  });

  test('every 50 h, 5 h either way, due at 1306.4 h and closed at 1299.9 h: next at 1349.9 h (same manual)', async () => {
    const { body } = await preview({
      triggers: [{ on: 'engine_hours', every: 50, first: 1306.4 }],
      window: { earlyHours: 5, lateHours: 5 },
      closings: [closed(1299.9)],
      count: 2,
    });
    expect(body).toMatchObject({
      triggers: [{ due: { hours: 1349.9 }, following: [{ hours: 1399.9 }, { hours: 1449.9 }] }],
    });
  });

  test('every 14 days or 10 h, closed on 22 May 1997 at 1709 h: due on 5 June 1997 or at 1719 h (same manual)', async () => {
    const { body } = await preview({
      triggers: [
        { on: 'calendar', rrule: 'FREQ=DAILY;INTERVAL=14', start: '1997-05-08' },
        { on: 'engine_hours', every: 10, first: 1709 },
      ],
      unit: { ...unit, engineHours: 1712 },
      closings: [closed(1709, '1997-05-22')],
      today: '1997-06-05',
      count: 1,
    });
    expect(body).toEqual({
      triggers: [
        { index: 0, due: { date: '1997-06-05' }, state: 'due', following: [{ date: '1997-06-19' }] },
        { index: 1, due: { hours: 1719 }, state: 'clear', following: [{ hours: 1729 }] },
      ],
      state: 'due',
    });
  });

  test('every 100 h, 10 h late allowed, due at 650 h and closed at 658 h: next at 750 h (14 CFR 91.409(b))', async () => {
    const { body } = await preview({
      triggers: [{ on: 'engine_hours', every: 100, first: 650 }],
      window: { lateHours: 10 },
      closings: [closed(658)],
    });
    expect(body).toMatchObject({ triggers: [{ due: { hours: 750 } }] });
  });

  test('every 100 h counted from when it was done, closed at 2010 h: next at 2110 h (AMC ML.A.302(d))', async () => {
    const { body } = await preview({
      triggers: [{ on: 'engine_hours', every: 100, first: 2000, anchor: 'completed' }],
      window: { lateHours: 10 },
      closings: [closed(2010)],
    });
    expect(body).toMatchObject({ triggers: [{ due: { hours: 2110 } }] });
  });

  test('yearly and done on 29 February 2012: next on 28 February 2013 (RFC 7529, SKIP=BACKWARD)', async () => {
    const { body } = await preview({
      triggers: [{ on: 'calendar', rrule: 'FREQ=YEARLY', start: '2012-02-29', anchor: 'completed' }],
      closings: [closed(0, '2012-02-29')],
      today: '2012-03-01',
      count: 1,
    });
    expect(body).toMatchObject({
      triggers: [{ due: { date: '2013-02-28' }, following: [{ date: '2014-02-28' }] }],
    });
  });
});

describe('the state of a unit, by hand from the table of states', () => {
  const rule = {
    triggers: [{ on: 'engine_hours', every: 50 }],
    lead: { hours: 5 },
    window: { lateHours: 2 },
  };
  test.each([
    [44.9, 'clear'],
    [45, 'upcoming'],
    [49.9, 'upcoming'],
    [50, 'due'],
    [51.9, 'due'],
    [52, 'overdue'],
  ])('at %s h, due at 50 h with 5 h lead and 2 h late, is %s', async (engineHours, state) => {
    const { body } = await preview({ ...rule, unit: { ...unit, engineHours } });
    expect(body).toMatchObject({ state, triggers: [{ state }] });
  });

  test.each([
    ['2026-06-11', 'upcoming'],
    ['2026-06-12', 'due'],
    ['2026-06-14', 'due'],
    ['2026-06-15', 'overdue'],
  ])('on %s, due on 12 June with 3 days lead and 2 days late, is %s', async (today, state) => {
    const { body } = await preview({
      triggers: [{ on: 'calendar', rrule: 'FREQ=MONTHLY;BYMONTHDAY=12', start: '2026-06-01' }],
      lead: { days: 3 },
      window: { lateDays: 2 },
      today,
    });
    expect(body).toMatchObject({ state });
  });

  test('outings count too, and a rule whose calendar is used up has no due point', async () => {
    const { body } = await preview({
      triggers: [
        { on: 'outings', every: 40 },
        { on: 'calendar', rrule: 'FREQ=DAILY;COUNT=1', start: '1999-07-01' },
      ],
      unit: { ...unit, enteredServiceOn: '1999-07-01', outings: 79 },
      closings: [{ on: '1999-07-01', engineHours: 0, outings: 40 }],
      count: 2,
    });
    expect(body).toEqual({
      triggers: [
        { index: 0, due: { outings: 80 }, state: 'clear', following: [{ outings: 120 }, { outings: 160 }] },
        { index: 1, due: null, state: 'clear', following: [] },
      ],
      state: 'clear',
    });
  });
});

const sundays = (rrule: string) => ({ on: 'calendar', rrule, start: '1990-01-01' });
const early = Array.from({ length: 200 }, () => closed(100));

// By a calendar: 29 February is a Sunday in 2004 and, with 2000 and 2100 out of the way, every 28 years after.
test('a day that comes once in 28 years is found after 200 closings, each too early', async () => {
  const { body } = await preview({
    triggers: [
      sundays('FREQ=DAILY;BYMONTH=2;BYMONTHDAY=29;BYDAY=SU;COUNT=9999'),
      sundays('FREQ=WEEKLY;BYMONTH=2;BYDAY=SU;COUNT=9999'),
    ],
    closings: early,
    count: 50,
  });
  const [leap, weekly] = body.triggers as { due: unknown; following: unknown[] }[];
  expect([leap?.due, ...leap!.following.slice(0, 3)]).toEqual([
    { date: '2004-02-29' },
    { date: '2032-02-29' },
    { date: '2060-02-29' },
    { date: '2088-02-29' },
  ]);
  expect(leap?.following).toHaveLength(50);
  // The first closing, years late, leaves the Sundays of Februaries up to its day behind; the others are early.
  expect(weekly?.due).toEqual({ date: '2000-02-06' });
});

test.each([
  ['triggers.0.rrule', { triggers: [{ on: 'calendar', rrule: 'FREQ=SECONDLY', start: '2026-01-01' }] }],
  ['count', { count: 51 }],
  ['count', { count: -1 }],
  ['today', { today: '2026-13-01' }],
  ['today', { today: undefined }],
  ['unit.engineHours', { unit: { ...unit, engineHours: -1 } }],
  ['unit.outings', { unit: { enteredServiceOn: '2026-01-01', engineHours: 1 } }],
  ['closings.1.on', { closings: [closed(30, '2026-02-02'), closed(60, '2026-02-01')] }],
  ['closings.0.engineHours', { closings: [closed(30.25)] }],
  ['window.earlyHours', { window: { earlyHours: 30 } }],
  ['name', { name: 'Rebuild' }],
  ['closings', { triggers: Array(3).fill(sundays('FREQ=YEARLY')), closings: early }],
  ['closings', { closings: [...early, closed(100)] }],
  ['triggers', { triggers: Array(9).fill({ on: 'outings', every: 40 }) }],
])('a preview that cannot be is refused at %s (case %#)', async (path, part) => {
  const { status, body } = await preview({ triggers: [{ on: 'engine_hours', every: 25 }], ...part });
  expect(status).toBe(422);
  expect(body.errors).toContainEqual({ path, message: expect.stringMatching(/\w/) as unknown });
});

test('a preview saves nothing', async () => {
  await preview({ triggers: [{ on: 'engine_hours', every: 25 }] });
  expect(await database.db.selectFrom('rule').select('id').execute()).toEqual([]);
});
