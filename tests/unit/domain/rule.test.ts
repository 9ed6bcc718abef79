import { describe, expect, it } from 'vitest';
import { type ScopedUnit, computeMinutes, ruleApplies } from '@/lib/domain/rule';

const twin: ScopedUnit = {
  modelId: 'twin-carb',
  propulsion: 'jet',
  stroke: 'two',
  carbCount: 2,
  dockId: 'north',
};
const electric: ScopedUnit = {
  ...twin,
  modelId: 'quiet',
  propulsion: 'electric',
  stroke: null,
  carbCount: 0,
};

describe('the scope of a rule', () => {
  it('without any part fits every unit', () => {
    expect(ruleApplies({}, twin)).toBe(true);
    expect(ruleApplies({}, electric)).toBe(true);
  });

  it.each([
    [{ modelIds: ['twin-carb', 'quiet'] }, true],
    [{ modelIds: ['quiet'] }, false],
    [{ modelIds: [] }, false],
    [{ propulsion: 'jet' as const }, true],
    [{ propulsion: 'outboard' as const }, false],
    [{ stroke: 'two' as const }, true],
    [{ stroke: 'four' as const }, false],
    [{ carbCount: { min: 2 } }, true],
    [{ carbCount: { min: 3 } }, false],
    [{ carbCount: { max: 2 } }, true],
    [{ carbCount: { max: 1 } }, false],
    [{ carbCount: { min: 1, max: 4 } }, true],
    [{ carbCount: {} }, true],
    [{ dockIds: ['south', 'north'] }, true],
    [{ dockIds: ['south'] }, false],
    [{ modelIds: ['twin-carb'], stroke: 'two' as const, dockIds: ['south'] }, false],
  ])('%j on a two-stroke twin at the north dock: %s', (scope, applies) => {
    expect(ruleApplies(scope, twin)).toBe(applies);
  });

  it('that asks for a stroke leaves electric units out', () => {
    expect(ruleApplies({ stroke: 'four' }, electric)).toBe(false);
  });

  it('that asks for carburettors leaves units without any out', () => {
    expect(ruleApplies({ carbCount: { min: 1 } }, electric)).toBe(false);
  });
});

// Worked by hand.
describe('work that grows with a unit', () => {
  const labour = { baseMinutes: 60, perCarbMinutes: 45, perEngineMinutes: 10 };

  it.each([
    [0, 1, 70],
    [1, 1, 115],
    [3, 1, 205],
    [4, 2, 260],
  ])('with %s carburettors and %s engines takes %s minutes', (carbCount, engines, minutes) => {
    expect(computeMinutes(labour, { carbCount, engines })).toBe(minutes);
  });
});
