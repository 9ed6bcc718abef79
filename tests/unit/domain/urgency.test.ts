import { describe, expect, test } from 'vitest';
import { compareUrgency, computeUrgency, type UrgentTask } from '@/lib/domain/urgency';

/** Worked by hand; today is 2026-07-08. */
const plain = {
  state: null,
  holdsUnit: false,
  started: false,
  plannedOn: null,
  today: '2026-07-08',
} as const;

describe('a task', () => {
  test.each([
    [
      'that holds its unit comes first, planned later or not',
      { holdsUnit: true, plannedOn: '2026-08-01' },
      'holding',
    ],
    [
      'that is overdue comes before what is planned for today',
      { state: 'overdue', plannedOn: '2026-07-08' },
      'overdue',
    ],
    ['planned for today is for today', { plannedOn: '2026-07-08' }, 'today'],
    ['planned for a day gone by is for today', { plannedOn: '2026-07-01' }, 'today'],
    ['that somebody has started is for today', { started: true, plannedOn: '2026-08-01' }, 'today'],
    ['that is due and not planned comes after that', { state: 'due' }, 'due'],
    ['that is due but planned later waits for its day', { state: 'due', plannedOn: '2026-07-09' }, 'later'],
    ['coming up without a plan is not planned yet', { state: 'upcoming' }, 'unplanned'],
    ['that no rule asks for is not planned yet', {}, 'unplanned'],
  ] as const)('%s', (_what, facts, urgency) => {
    expect(computeUrgency({ ...plain, ...facts })).toBe(urgency);
  });

  test('comes in order of urgency, then of its planned day, then of how long it has been open', () => {
    const task = (id: string, fields: Partial<UrgentTask>): UrgentTask => ({
      id,
      urgency: 'unplanned',
      plannedOn: null,
      openedAt: '2026-07-01T00:00:00.000Z',
      fleetNumber: 'J-01',
      ...fields,
    });
    const inOrder = [
      task('a', { urgency: 'holding', plannedOn: '2026-08-01' }),
      task('b', { urgency: 'holding' }),
      task('c', { urgency: 'overdue', openedAt: '2026-06-01T00:00:00.000Z' }),
      task('d', { urgency: 'overdue', fleetNumber: 'J-01' }),
      task('e', { urgency: 'overdue', fleetNumber: 'J-02' }),
      task('f', { urgency: 'later', plannedOn: '2026-07-09' }),
      task('g', { urgency: 'later', plannedOn: '2026-07-10' }),
    ];
    const shuffled = [4, 0, 6, 2, 5, 1, 3].map((index) => inOrder[index]!);
    expect(shuffled.sort(compareUrgency)).toEqual(inOrder);
  });
});
