import { expect, test } from 'vitest';
import { draftSteps, moveStep, newStep, toSteps } from '@/components/procedures/procedure-draft';
import { STARTER_PROCEDURES } from '@/lib/domain/starter/procedures';
import { createProcedure } from '@/lib/schemas/procedure';

test.each(STARTER_PROCEDURES.map(({ name, steps }) => [name, steps] as const))(
  '%s comes out of the form as it went in',
  (_, steps) => {
    expect(toSteps(draftSteps(steps))).toEqual(steps);
  },
);

test('a new step is named after its title, no two alike, and what depends on it follows when it moves or is renamed', () => {
  const look = { ...newStep(0), title: 'Look: is it dry?' };
  const again = { ...newStep(1), title: 'Look: is it dry?' };
  const mend = { ...newStep(2), title: 'Überholen', when: [{ row: 1, outcome: 'fail' as const }] };
  expect(toSteps([look, again, mend]).map(({ key, when }) => [key, when])).toEqual([
    ['look-is-it-dry', undefined],
    ['look-is-it-dry-2', undefined],
    ['uberholen', [{ step: 'look-is-it-dry-2', outcome: 'fail' }]],
  ]);
  const moved = moveStep([{ ...look, title: 'Look' }, again, mend], 1, -1);
  expect(toSteps(moved).map(({ key, when }) => [key, when])).toEqual([
    ['look-is-it-dry', undefined],
    ['look', undefined],
    ['uberholen', [{ step: 'look-is-it-dry', outcome: 'fail' }]],
  ]);
});

test('a step that depends on one taken away is refused at that step', () => {
  const mend = { ...newStep(2), title: 'Mend', when: [{ row: 1, outcome: 'fail' as const }] };
  const parsed = createProcedure.safeParse({ name: 'Flush', kind: 'service', steps: toSteps([mend]) });
  expect(parsed.error!.issues.map(({ path }) => path.join('.'))).toEqual(['steps.0.when']);
});

test('only what its kind can have goes along with a step', () => {
  const step = {
    ...newStep(0),
    kind: 'note' as const,
    title: 'Say',
    spec: 'Gap',
    opens: 'task' as const,
    failTitle: 'X',
  };
  expect(toSteps([step])).toEqual([{ key: 'say', kind: 'note', title: 'Say', per: 'unit', required: true }]);
});
