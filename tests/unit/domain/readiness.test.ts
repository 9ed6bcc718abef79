import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type DuePoint, computeState } from '@/lib/domain/due';
import { type HoldingPoint, computeRoom, describeHold, describeLift } from '@/lib/domain/readiness';

const standing = { engineHoursTenths: 6612, outings: 41, today: '2026-07-04' };
const hoursPoint = (dueTenths: number, late = 0): DuePoint => ({
  on: 'engine_hours',
  dueTenths,
  upcomingFromTenths: dueTenths - 100,
  overdueFromTenths: dueTenths + late,
});
const dayPoint = (dueOn: string, overdueFromOn: string): DuePoint => ({
  on: 'calendar',
  dueOn,
  upcomingFromOn: dueOn,
  overdueFromOn,
});
const outingsPoint = (dueOutings: number, late = 0): DuePoint => ({
  on: 'outings',
  dueOutings,
  upcomingFromOutings: dueOutings,
  overdueFromOutings: dueOutings + late,
});

describe('a hold in words', () => {
  const overdue = (point: DuePoint) =>
    describeHold({ reason: 'overdue', ruleName: 'Pump inspection', point, standing });

  it.each([
    [
      hoursPoint(6500, 100),
      'Pump inspection was due at 650.0 h, at the latest before 660.0 h; the unit has run 661.2 h.',
    ],
    [hoursPoint(6500), 'Pump inspection was due at 650.0 h; the unit has run 661.2 h.'],
    [outingsPoint(40), 'Pump inspection was due at outing 40; the unit has made 41 outings.'],
    [
      dayPoint('2026-06-28', '2026-07-04'),
      'Pump inspection was due on Sun 28 Jun 2026, at the latest on Fri 3 Jul 2026.',
    ],
    [dayPoint('2026-07-03', '2026-07-04'), 'Pump inspection was due on Fri 3 Jul 2026.'],
  ])('says what was due and when', (point, text) => {
    expect(overdue(point)).toBe(text);
  });

  it('says which defect, why laid up, and that nothing was computed', () => {
    expect(describeHold({ reason: 'defect', title: 'Steering stiff' })).toBe(
      'Defect reported: Steering stiff.',
    );
    expect(describeHold({ reason: 'laid_up', note: 'winter' })).toBe('Laid up: winter.');
    expect(describeHold({ reason: 'laid_up' })).toBe('Laid up.');
    expect(describeHold({ reason: 'not_assessed' })).toMatch(/^Not yet assessed/);
    expect(describeHold({ reason: 'not_assessed', ruleName: 'Hull check' })).toContain('Hull check');
  });

  it('says what lifts each', () => {
    expect(describeLift({ reason: 'overdue', ruleName: 'Pump inspection' })).toContain('closes the task');
    expect(describeLift({ reason: 'overdue' })).toContain('closes the task');
    expect(describeLift({ reason: 'defect' })).toContain('clears the defect');
    expect(describeLift({ reason: 'laid_up' })).toContain('ends the lay-up');
    expect(describeLift({ reason: 'not_assessed' })).toContain('worker');
  });
});

// Worked by hand; the usual pace is five hours, or five outings, in three days.
describe('room before the next hold', () => {
  it('is none by any measure for a unit that no rule holds', () => {
    expect(computeRoom([], standing)).toEqual({
      tenthsToHold: null,
      outingsToHold: null,
      daysToHold: null,
      ruleId: null,
    });
  });

  it('is the least by each measure, and names the rule that holds first', () => {
    const points: HoldingPoint[] = [
      { ruleId: 'hundred hours', point: hoursPoint(6800, 100) },
      { ruleId: 'fifty hours', point: hoursPoint(6700) },
      { ruleId: 'yearly', point: dayPoint('2026-07-04', '2026-07-06') },
      { ruleId: 'forty outings', point: outingsPoint(80) },
    ];
    // 8.8 h are 5.3 days, 39 outings are 23 days, and the yearly check holds in 2 days.
    expect(computeRoom(points, standing)).toEqual({
      tenthsToHold: 88,
      outingsToHold: 39,
      daysToHold: 2,
      ruleId: 'yearly',
    });
    // At 8.0 h a day the 8.8 h are gone first.
    expect(computeRoom(points, standing, { tenthsPerDay: 80, outingsPerDay: 3 }).ruleId).toBe('fifty hours');
  });

  it('is negative by how far a unit is past, and names the rule it is furthest past', () => {
    const points: HoldingPoint[] = [
      { ruleId: 'hundred hours', point: hoursPoint(6500, 100) },
      { ruleId: 'yearly', point: dayPoint('2026-06-01', '2026-06-02') },
    ];
    expect(computeRoom(points, standing)).toMatchObject({
      tenthsToHold: -12,
      daysToHold: -32,
      ruleId: 'yearly',
    });
  });

  it('still names the rule for a unit that is never used', () => {
    const room = computeRoom([{ ruleId: 'fifty hours', point: hoursPoint(6700) }], standing, {
      tenthsPerDay: 0,
      outingsPerDay: 0,
    });
    expect(room.ruleId).toBe('fifty hours');
  });

  it('is used up exactly when the unit is overdue', () => {
    fc.assert(
      fc.property(fc.integer({ min: 6000, max: 7200 }), fc.nat(100), (dueTenths, late) => {
        const point = hoursPoint(dueTenths, late);
        const { tenthsToHold } = computeRoom([{ ruleId: 'fifty hours', point }], standing);
        expect(tenthsToHold! <= 0).toBe(computeState(point, standing) === 'overdue');
      }),
    );
  });
});
