import { expect, test } from 'vitest';
import { checkClosing, describePlace, type ClosingFacts } from '@/lib/domain/closing-check';
import type { EntryValue, Step, StepEntry } from '@/lib/domain/procedure';
import { computeSteps } from '@/lib/domain/step-states';

const TWIN = { engines: 1, cylinders: 2, carbCount: 2 };
const STEPS: Step[] = [
  { key: 'holds', kind: 'check', title: 'The needle holds', per: 'carb', required: true },
  {
    key: 'again',
    kind: 'check',
    title: 'The needle holds now',
    per: 'carb',
    required: true,
    when: [{ step: 'holds', outcome: 'fail' }],
    retests: 'holds',
  },
  { key: 'air', kind: 'check', title: 'Air box is clean', per: 'unit', required: false },
];
const check = (
  stepKey: string,
  place: number,
  outcome: 'pass' | 'fail' | 'not_applicable' = 'pass',
): StepEntry => ({ stepKey, place, stage: null, value: { kind: 'check', outcome } satisfies EntryValue });

const faults = (entries: StepEntry[], more: Partial<ClosingFacts> = {}) =>
  checkClosing({
    states: computeSteps({ steps: STEPS, counts: TWIN, specs: {}, entries }),
    holdsUnit: true,
    followUps: [],
    signOffs: [],
    wants: { secondPerson: false, testRide: false },
    closerId: 'mira',
    ...more,
  }).map(({ on, stepKey, place }) => [on, stepKey, place]);

const HELD = [check('holds', 1), check('holds', 2)];

test('work is closed when every required step has a result at every place', () => {
  expect(faults([])).toEqual([
    ['missing', 'holds', 1],
    ['missing', 'holds', 2],
  ]);
  expect(faults([check('holds', 1)])).toEqual([['missing', 'holds', 2]]);
  expect(faults(HELD)).toEqual([]);
  expect(faults([...HELD, check('air', 0, 'not_applicable')])).toEqual([]);
});

test('a step that is tested again after the work stands as it then came out', () => {
  const failed = [check('holds', 1), check('holds', 2, 'fail')];
  expect(faults(failed)).toEqual([
    ['missing', 'again', 2],
    ['failed', 'holds', 2],
  ]);
  expect(faults([...failed, check('again', 2)])).toEqual([]);
  expect(faults([...failed, check('again', 2, 'fail')])).toEqual([['failed', 'again', 2]]);
});

test('what holds the unit is not closed over a failure unless a follow-up at that place answers for it', () => {
  const failed = [...HELD, check('air', 0, 'fail')];
  expect(faults(failed)).toEqual([['failed', 'air', 0]]);
  expect(faults(failed, { holdsUnit: false })).toEqual([]);
  expect(faults(failed, { followUps: [{ stepKey: 'air', place: 0, answers: true }] })).toEqual([]);
  expect(faults(failed, { followUps: [{ stepKey: 'air', place: 0, answers: false }] })).toEqual([
    ['failed', 'air', 0],
  ]);
  expect(faults(failed, { followUps: [{ stepKey: 'air', place: 1, answers: true }] })).toEqual([
    ['failed', 'air', 0],
  ]);
});

test('a second person signs for what stands, and is not who closes', () => {
  const wants = { secondPerson: true, testRide: true };
  const ride = { kind: 'test_ride' as const, personId: 'mira', stands: true };
  const second = { kind: 'second_person' as const, personId: 'tove', stands: true };
  expect(faults(HELD, { wants })).toEqual([
    ['test_ride', null, 0],
    ['second_person', null, 0],
  ]);
  expect(faults(HELD, { wants, signOffs: [ride, second] })).toEqual([]);
  expect(faults(HELD, { wants, signOffs: [ride, { ...second, stands: false }] })).toEqual([
    ['second_person', null, 0],
  ]);
  expect(faults(HELD, { wants, signOffs: [ride, { ...second, personId: 'mira' }] })).toEqual([
    ['second_person', null, 0],
  ]);
});

test('a place is named by what it is', () => {
  expect(describePlace('carb', 2)).toBe('carburettor 2');
  expect(describePlace('unit', 0)).toBe('');
});
