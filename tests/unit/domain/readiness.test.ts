import { describe, expect, it } from 'vitest';
import type { DuePoint } from '@/lib/domain/due';
import { describeHold, describeLift, findNearestRule } from '@/lib/domain/readiness';

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
describe('the rule that holds a unit first', () => {
  const none = {
    tenths: null,
    hoursRuleId: null,
    outings: null,
    outingsRuleId: null,
    days: null,
    daysRuleId: null,
  };
  const room = {
    tenths: 88,
    hoursRuleId: 'fifty hours',
    outings: 39,
    outingsRuleId: 'forty outings',
    days: 2,
    daysRuleId: 'yearly',
  };

  it('is none for a unit that no rule holds', () => {
    expect(findNearestRule(none)).toBeNull();
  });

  it('is the one with the fewest days left, hours and outings turned into days at the unit’s pace', () => {
    // 8.8 h are 5.3 days, 39 outings are 23 days, and the yearly check holds in 2 days.
    expect(findNearestRule(room)).toBe('yearly');
    // At 8.0 h a day the 8.8 h are gone first.
    expect(findNearestRule(room, { tenthsPerDay: 80, outingsPerDay: 3 })).toBe('fifty hours');
  });

  it('is the one it is furthest past', () => {
    expect(findNearestRule({ ...room, tenths: -12, days: -32 })).toBe('yearly');
  });

  it('is named for a unit that is never used', () => {
    const left = { ...none, tenths: 88, hoursRuleId: 'fifty hours' };
    expect(findNearestRule(left, { tenthsPerDay: 0, outingsPerDay: 0 })).toBe('fifty hours');
  });
});
