import { expect, test } from 'vitest';
import type { Step } from '@/lib/domain/procedure';
import { describeChanges } from '@/lib/domain/procedure-changes';

const step = (key: string, more: Partial<Step> = {}): Step => ({
  key,
  kind: 'check',
  title: `Step ${key}`,
  per: 'unit',
  required: true,
  ...more,
});

test('says which steps are new, changed and gone', () => {
  const before = [step('a'), step('b'), step('c')];
  const after = [step('a'), step('b', { required: false }), step('d'), step('e')];
  expect(describeChanges(before, after)).toEqual([
    'Changed: Step b',
    'New: Step d',
    'New: Step e',
    'Gone: Step c',
  ]);
  expect(describeChanges([step('a')], [step('a', { title: 'Look' })])).toEqual(['Changed: Step a → Look']);
});

test('the same steps in another order are said so, and a step among others is no change of order', () => {
  expect(describeChanges([step('a'), step('b')], [step('b'), step('a')])).toEqual([
    'The order of the steps is another.',
  ]);
  expect(describeChanges([step('a'), step('b')], [step('a'), step('x'), step('b')])).toEqual(['New: Step x']);
});

test('the same step with its fields written in another order has not changed', () => {
  const one: Step = { ...step('a'), onFail: { open: 'defect', title: 'Leak', holdsUnit: true } };
  const other: Step = { onFail: { holdsUnit: true, title: 'Leak', open: 'defect' }, ...step('a') };
  expect(describeChanges([one], [other])).toEqual([]);
});
