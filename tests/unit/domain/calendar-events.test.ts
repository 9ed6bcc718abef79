import { describe, expect, test } from 'vitest';
import { placeOnCalendar } from '@/lib/domain/calendar-events';
import { computeRange, computeStep } from '@/lib/domain/calendar-range';

/** Worked by hand from the rule in the docstring; today is Wed 2026-07-08. */
const today = '2026-07-08';

describe('open work stands on', () => {
  test.each([
    [
      'the day it is planned on',
      { plannedOn: '2026-07-20', state: 'upcoming', dueOn: '2026-07-15' },
      '2026-07-20',
    ],
    [
      'the day it is planned on, overdue or not',
      { plannedOn: '2026-07-20', state: 'overdue', dueOn: null },
      '2026-07-20',
    ],
    [
      'today, when that plan has gone by',
      { plannedOn: '2026-07-01', state: 'upcoming', dueOn: '2026-07-15' },
      today,
    ],
    ['today, when it is overdue by its meter', { plannedOn: null, state: 'overdue', dueOn: null }, today],
    [
      'today, when it fell due on a day gone by',
      { plannedOn: null, state: 'overdue', dueOn: '2026-07-03' },
      today,
    ],
    [
      'today, when its meter makes it due before its date',
      { plannedOn: null, state: 'due', dueOn: '2026-07-15' },
      today,
    ],
    [
      'the day it is due, before that day',
      { plannedOn: null, state: 'upcoming', dueOn: '2026-07-15' },
      '2026-07-15',
    ],
    [
      'no day, when it goes by its meter and is not due',
      { plannedOn: null, state: 'upcoming', dueOn: null },
      null,
    ],
    [
      'no day, when no rule asks for it and nobody planned it',
      { plannedOn: null, state: null, dueOn: null },
      null,
    ],
  ] as const)('%s', (_what, facts, on) => {
    expect(placeOnCalendar({ ...facts, today })).toBe(on);
  });
});

describe('a view shows', () => {
  // By a printed calendar: 1 July 2026 is a Wednesday, 1 February 2027 a Monday.
  test.each([
    ['month', '2026-07-08', '2026-06-29', '2026-08-09'],
    ['month', '2027-02-28', '2027-02-01', '2027-03-14'],
    ['week', '2026-07-08', '2026-07-06', '2026-07-12'],
    ['week', '2026-07-12', '2026-07-06', '2026-07-12'],
    ['list', '2028-02-10', '2028-02-01', '2028-02-29'],
  ] as const)('as a %s around %s the days from %s to %s', (view, day, from, to) => {
    expect(computeRange(view, day)).toEqual({ from, to });
  });

  test.each([
    ['month', '2026-12-31', 1, '2027-01-01'],
    ['month', '2026-01-31', -1, '2025-12-01'],
    ['list', '2026-02-28', 1, '2026-03-01'],
    ['week', '2026-12-30', 1, '2027-01-06'],
  ] as const)('from a %s at %s, stepping %d, %s', (view, day, step, to) => {
    expect(computeStep(view, day, step)).toBe(to);
  });
});
