import { describe, expect, it } from 'vitest';
import type { PartNeed } from '@/lib/domain/rule';
import {
  checkTaking,
  computeFree,
  computeKits,
  computeNeeds,
  computeReservation,
  computeTaskNeeds,
  isLow,
} from '@/lib/domain/stock';

// Every figure here is worked by hand.
const NEEDS: PartNeed[] = [
  { partId: 'carb kit', quantity: 1, per: 'carb' },
  { partId: 'plug', quantity: 1, per: 'cylinder' },
  { partId: 'filter', quantity: 2, per: 'engine' },
  { partId: 'hose', quantity: 3, per: 'unit' },
  { partId: 'plug', quantity: 1, per: 'unit' },
];

describe('what work takes', () => {
  it('grows with the unit, its engines, cylinders and carburettors, added up by part', () => {
    expect(computeNeeds(NEEDS, { engines: 2, cylinders: 6, carbCount: 6 })).toEqual([
      { partId: 'carb kit', quantity: 6 },
      { partId: 'plug', quantity: 7 },
      { partId: 'filter', quantity: 4 },
      { partId: 'hose', quantity: 3 },
    ]);
  });

  it('is no carburettor kit for a unit without carburettors', () => {
    const kit: PartNeed[] = [{ partId: 'carb kit', quantity: 1, per: 'carb' }];
    expect(computeNeeds(kit, { engines: 1, cylinders: 4, carbCount: 0 })).toEqual([]);
  });

  it.each([
    ['carb', [{ partId: 'carb kit', quantity: 1 }]],
    ['cylinder', [{ partId: 'plug', quantity: 1 }]],
    ['engine', [{ partId: 'filter', quantity: 2 }]],
  ] as const)('on one %s only is what is per that, once', (per, needs) => {
    const unit = { engines: 1, cylinders: 3, carbCount: 3 };
    expect(computeNeeds(NEEDS, unit, { per, place: 2 })).toEqual(needs);
  });

  it('is what somebody said of a part, whatever the rule asks for; none said is none', () => {
    const asked = [
      { partId: 'carb kit', quantity: 2 },
      { partId: 'hose', quantity: 3 },
    ];
    const said = [
      { partId: 'hose', quantity: 0 },
      { partId: 'clamp', quantity: 4 },
      { partId: 'carb kit', quantity: 1 },
    ];
    expect(computeTaskNeeds(asked, said)).toEqual([
      { partId: 'clamp', quantity: 4 },
      { partId: 'carb kit', quantity: 1 },
    ]);
    expect(computeTaskNeeds(asked, [])).toEqual(asked);
  });
});

describe('what lies on a shelf', () => {
  it.each([
    [5, 0, 5],
    [5, 2, 3],
    [2, 5, 0],
    [-1, 0, 0],
  ])('with %s on hand and %s reserved has %s free', (onHand, reserved, free) => {
    expect(computeFree({ onHand, reserved })).toBe(free);
  });

  it.each([
    [4, 0, 3, false],
    [3, 0, 3, true],
    [5, 2, 3, true],
    [0, 0, 0, true],
    [1, 0, 0, false],
    [-2, 0, 0, true],
    [0, 0, null, false],
  ])('with %s on hand, %s reserved and a mark at %s is low: %s', (onHand, reserved, lowAt, low) => {
    expect(isLow({ onHand, reserved }, lowAt)).toBe(low);
  });

  it('makes up as many kits as the scarcest of their parts allows', () => {
    const free: Record<string, number> = { gasket: 7, diaphragm: 5, needle: 2 };
    const contents = [
      { partId: 'gasket', quantity: 3 },
      { partId: 'diaphragm', quantity: 1 },
      { partId: 'needle', quantity: 1 },
    ];
    expect(computeKits(contents, (id) => free[id]!)).toBe(2);
    expect(computeKits([{ partId: 'gasket', quantity: 4 }], (id) => free[id]!)).toBe(1);
    expect(computeKits([], () => 9)).toBe(0);
  });

  it.each([
    [2, 0, 5, 2],
    [2, 1, 5, 1],
    [2, 0, 1, 1],
    [2, 2, 5, 0],
    [2, 3, 5, 0],
    [2, 0, 0, 0],
  ])('needed %s with %s set aside and %s free sets %s more aside', (needed, has, free, more) => {
    expect(computeReservation(needed, has, free)).toBe(more);
  });
});

describe('taking from a shelf', () => {
  it.each([
    [3, 0, 3],
    [3, 1, 2],
    [0, 0, 0],
  ])('that has %s, %s of them for others, gives %s without a reason', (onHand, reserved, quantity) => {
    expect(checkTaking({ onHand, reserved }, quantity)).toBeNull();
  });

  it.each([
    [3, 0, 4, 'only 3 on hand: say why more were taken'],
    [0, 0, 1, 'none on hand: say why it was taken all the same'],
    [-2, 0, 1, 'none on hand: say why it was taken all the same'],
    [3, 1, 3, '1 of 3 on hand are reserved for other work: say why they are taken'],
  ])('that has %s, %s of them for others, wants a reason for %s', (onHand, reserved, quantity, why) => {
    expect(checkTaking({ onHand, reserved }, quantity)).toBe(why);
  });
});
