import { describe, expect, test } from 'vitest';
import type { MeasuredUnit } from '@/lib/domain/measured-value';
import { parseMeasured } from '@/lib/domain/measured-value';
import { mergeSpecs, type Specs } from '@/lib/domain/measurement';
import type { EntryValue, Stage, Step, StepEntry } from '@/lib/domain/procedure';
import { computeSteps, countDone, findMissing, findOpenFailures } from '@/lib/domain/step-states';

const TWIN = { engines: 1, cylinders: 2, carbCount: 2 };
const SPECS: Specs = {
  'Pop-off pressure': { min: 21, max: 37, unit: 'psi', repeats: 2, maxSpread: { amount: 1, of: 'unit' } },
};
/** A pop-off test per carburettor; the needle is disturbed only where it fails. */
const STEPS: Step[] = [
  { key: 'air', kind: 'caution', title: 'Air the bench', per: 'unit', required: true },
  {
    key: 'pop-off',
    kind: 'measurement',
    title: 'Pop-off test, wet',
    per: 'carb',
    required: true,
    measures: { spec: 'Pop-off pressure', unit: 'psi', stages: ['found', 'left'] },
  },
  {
    key: 'needle',
    kind: 'check',
    title: 'Renew needle and seat',
    per: 'carb',
    required: true,
    when: [{ step: 'pop-off', outcome: 'fail' }],
  },
  {
    key: 'report',
    kind: 'note',
    title: 'Say what was wrong',
    per: 'unit',
    required: true,
    when: [{ step: 'pop-off', outcome: 'fail' }],
  },
  { key: 'screws', kind: 'check', title: 'Screw heads are whole', per: 'carb', required: true },
];

const runs = (unit: MeasuredUnit, ...texts: string[]): EntryValue => ({
  kind: 'measurement',
  runs: texts.map((text) => {
    const parsed = parseMeasured(text, unit);
    if ('fault' in parsed) throw new Error(parsed.fault);
    return parsed;
  }),
});
const entry = (stepKey: string, place: number, value: EntryValue, stage: Stage | null = null): StepEntry => ({
  stepKey,
  place,
  stage,
  value,
});
const popOff = (place: number, stage: Stage, ...texts: string[]) =>
  entry('pop-off', place, runs('psi', ...texts), stage);
const pass: EntryValue = { kind: 'check', outcome: 'pass' };
const work = (entries: StepEntry[], change = {}) =>
  computeSteps({ steps: STEPS, counts: TWIN, specs: SPECS, entries, ...change });
const appliesOf = (key: string, entries: StepEntry[]) =>
  work(entries)
    .find(({ step }) => step.key === key)!
    .places.map(({ applies }) => applies);

describe('a twin whose second carburettor fails the pop-off test as found', () => {
  const found = [popOff(1, 'found', '25', '25'), popOff(2, 'found', '18', '18')];

  test('is asked for the needle of that one alone, and for the note', () => {
    expect(appliesOf('needle', [])).toEqual(['waits', 'waits']);
    expect(appliesOf('needle', found.slice(0, 1))).toEqual(['no', 'waits']);
    expect(appliesOf('needle', found)).toEqual(['no', 'yes']);
    expect(appliesOf('report', found)).toEqual(['yes']);
    expect(appliesOf('report', [popOff(1, 'found', '25', '25'), popOff(2, 'found', '30', '30')])).toEqual([
      'no',
    ]);
  });

  test('leaves the first alone, and measures the second again after the work', () => {
    expect(findMissing(work(found)).map(({ stepKey, place, stage }) => [stepKey, place, stage])).toEqual([
      ['pop-off', 2, 'left'],
      ['needle', 2, null],
      ['report', 0, null],
      ['screws', 1, null],
      ['screws', 2, null],
    ]);
    expect(findOpenFailures(work(found)).map(({ step, place }) => [step.key, place])).toEqual([
      ['pop-off', 2],
    ]);
  });

  test('is done when the second passes as left and the rest is answered; as found goes on deciding', () => {
    const done = [
      ...found,
      popOff(2, 'left', '26', '26'),
      entry('needle', 2, pass),
      entry('report', 0, { kind: 'note', text: 'Worn tip.' }),
      entry('screws', 1, { kind: 'check', outcome: 'not_applicable' }),
      entry('screws', 2, pass),
    ];
    expect(findMissing(work(done))).toEqual([]);
    expect(findOpenFailures(work(done))).toEqual([]);
    expect(appliesOf('needle', done)).toEqual(['no', 'yes']);
    expect(countDone(work(done))).toEqual({ done: 6, of: 6 });
  });
});

test('the latest entry counts, and one taken back counts as none', () => {
  const twice = [
    popOff(1, 'found', '18', '18'),
    popOff(1, 'found', '25', '25'),
    popOff(2, 'found', '25', '25'),
  ];
  expect(appliesOf('needle', twice)).toEqual(['no', 'no']);
  expect(appliesOf('needle', [...twice, entry('pop-off', 1, { kind: 'cleared' }, 'found')])).toEqual([
    'waits',
    'no',
  ]);
});

test('one run of two is no result yet', () => {
  expect(appliesOf('needle', [popOff(1, 'found', '18'), popOff(2, 'found', '25', '25')])).toEqual([
    'waits',
    'no',
  ]);
});

test('either of two failing steps is enough, and both must be known before the step is spared', () => {
  const holds: Step = { key: 'holds', kind: 'check', title: 'Needle holds', per: 'carb', required: true };
  const set: Step = { key: 'set', kind: 'check', title: 'Set it', per: 'carb', required: true };
  const when = ['pop-off', 'holds'].map((step) => ({ step, outcome: 'fail' as const }));
  const steps = [STEPS[1]!, holds, { ...set, when }];
  const applies = (...entries: StepEntry[]) =>
    computeSteps({ steps, counts: { ...TWIN, carbCount: 1 }, specs: SPECS, entries })[2]!.places[0]!.applies;
  const good = popOff(1, 'found', '25', '25');
  expect(applies(good)).toBe('waits');
  expect(applies(good, entry('holds', 1, pass))).toBe('no');
  expect(applies(good, entry('holds', 1, { kind: 'check', outcome: 'fail' }))).toBe('yes');
  expect(applies(popOff(1, 'found', '18', '18'))).toBe('yes');
});

test('what one step measures as found stands at last as another step measures it as left', () => {
  const measures = { spec: 'Pop-off pressure', unit: 'psi' as const };
  const steps: Step[] = [
    { ...STEPS[1]!, measures: { ...measures, stages: ['found'] } },
    { ...STEPS[1]!, key: 'closed', measures: { ...measures, stages: ['left'] } },
  ];
  const failures = (...entries: StepEntry[]) =>
    findOpenFailures(computeSteps({ steps, counts: TWIN, specs: SPECS, entries })).map(({ step, place }) => [
      step.key,
      place,
    ]);
  const bad = popOff(2, 'found', '18', '18');
  expect(failures(bad)).toEqual([['pop-off', 2]]);
  expect(failures(bad, entry('closed', 2, runs('psi', '26', '26'), 'left'))).toEqual([]);
  expect(failures(bad, entry('closed', 1, runs('psi', '26', '26'), 'left'))).toEqual([['pop-off', 2]]);
});

test('a follow-up for one carburettor has that one alone', () => {
  const states = work([], { only: { per: 'carb', place: 2 } });
  expect(states.map(({ step, places }) => [step.key, places.map(({ place }) => place)])).toEqual([
    ['air', [0]],
    ['pop-off', [2]],
    ['needle', [2]],
    ['report', [0]],
    ['screws', [2]],
  ]);
});

test('a check that does not apply settles what depends on it: it is not done', () => {
  const steps: Step[] = [
    { key: 'a', kind: 'check', title: 'Filter fitted', per: 'unit', required: true },
    {
      key: 'b',
      kind: 'check',
      title: 'Renew it',
      per: 'unit',
      required: true,
      when: [{ step: 'a', outcome: 'fail' }],
    },
  ];
  const states = computeSteps({
    steps,
    counts: TWIN,
    specs: {},
    entries: [entry('a', 0, { kind: 'check', outcome: 'not_applicable' })],
  });
  expect(states[1]!.places[0]!.applies).toBe('no');
});

test('a unit’s own limits stand in front of its model’s, field by field', () => {
  expect(
    mergeSpecs({ Compression: { min: 150, unit: 'psi' }, Gap: { max: 1 } }, { Compression: { min: 120 } }),
  ).toEqual({ Compression: { min: 120, unit: 'psi' }, Gap: { max: 1 } });
});
