import fc from 'fast-check';
import { expect, test } from 'vitest';
import { createRule } from '@/lib/schemas/rule';
import { fromDuePoint, fromSchedule, toSchedule, toTenths } from '@/lib/schemas/schedule-shape';

const tenths = fc.integer({ min: 0, max: 999_999 });
const few = fc.integer({ min: 0, max: 3000 });
const anchor = fc.constantFrom('scheduled' as const, 'completed' as const);
const trigger = fc.oneof(
  fc.record({ on: fc.constant('engine_hours' as const), every: tenths, first: tenths, anchor }),
  fc.record({ on: fc.constant('outings' as const), every: few, anchor }),
  fc.record({
    on: fc.constant('calendar' as const),
    rrule: fc.constant('FREQ=MONTHLY'),
    start: fc.constant('2026-01-31'),
    anchor,
  }),
);
const schedule = fc.record({
  triggers: fc.array(trigger, { minLength: 1, maxLength: 8 }),
  lead: fc.record({ tenths, outings: few, days: few }),
  window: fc.record({
    earlyTenths: tenths,
    lateTenths: tenths,
    earlyOutings: few,
    lateOutings: few,
    earlyDays: few,
    lateDays: few,
  }),
});

test('every tenth of an hour that a meter can show comes back as it was', () => {
  fc.assert(fc.property(schedule, (given) => void expect(toSchedule(fromSchedule(given))).toEqual(given)));
});

test('1472.7 h is 14727 tenths, and a due point shows it as 1472.7 h again', () => {
  expect(toTenths(1472.7)).toBe(14_727);
  const point = {
    on: 'engine_hours' as const,
    dueTenths: 14_727,
    upcomingFromTenths: 0,
    overdueFromTenths: 0,
  };
  expect(fromDuePoint(point)).toEqual({ hours: 1472.7 });
});

test('what is left out of a rule is 0, scheduled, holding the unit and without parts', () => {
  const sent = { name: 'Oil', kind: 'service', appliesTo: {}, triggers: [{ on: 'outings', every: 5 }] };
  expect(createRule.parse(sent)).toEqual({
    ...sent,
    triggers: [{ on: 'outings', every: 5, anchor: 'scheduled' }],
    lead: { hours: 0, outings: 0, days: 0 },
    window: { earlyHours: 0, lateHours: 0, earlyOutings: 0, lateOutings: 0, earlyDays: 0, lateDays: 0 },
    holdsUnit: true,
    labour: { baseMinutes: 0, perCarbMinutes: 0, perEngineMinutes: 0 },
    parts: [],
    wantsSecondPerson: false,
    wantsTestRide: false,
  });
});

test.each([
  ['FREQ=HOURLY', 'FREQ must be DAILY, WEEKLY, MONTHLY or YEARLY'],
  ['FREQ=WEEKLY;BYMONTHDAY=1', 'BYMONTHDAY cannot be used with FREQ=WEEKLY'],
  ['FREQ=DAILY;COUNT=3;UNTIL=20261231', 'UNTIL cannot stand beside COUNT'],
])('the recurrence rule %s is refused with its reason', (rrule, message) => {
  const triggers = [{ on: 'calendar', rrule, start: '2026-01-01' }];
  const parsed = createRule.safeParse({ name: 'Oil', kind: 'service', appliesTo: {}, triggers });
  expect(parsed.error?.issues).toMatchObject([{ path: ['triggers', 0, 'rrule'], message }]);
});
