import { describe, expect, test } from 'vitest';
import { fromRrule, toRrule } from '@/components/rules/calendar-draft';
import { checkDraft, draftOf, newDraft, toInput } from '@/components/rules/rule-draft';
import { createRule, type Rule } from '@/lib/schemas/rule';

describe('the calendar on the rule form', () => {
  test.each([
    ['FREQ=YEARLY', 'step'],
    ['FREQ=DAILY;INTERVAL=14', 'step'],
    ['FREQ=WEEKLY;BYDAY=MO,TH', 'weekdays'],
    ['FREQ=WEEKLY;INTERVAL=2;BYDAY=SA', 'weekdays'],
    ['FREQ=MONTHLY;BYMONTHDAY=15', 'month_day'],
    ['FREQ=MONTHLY;INTERVAL=3;BYMONTHDAY=-1', 'month_day'],
  ])('shows %s in plain fields and gives it back', (rrule, way) => {
    const draft = fromRrule(rrule);
    expect(draft.way).toBe(way);
    expect(toRrule(draft)).toBe(rrule);
  });

  test.each([
    'FREQ=MONTHLY;BYDAY=1MO',
    'FREQ=YEARLY;COUNT=3',
    'FREQ=WEEKLY;WKST=SU;INTERVAL=2;BYDAY=TU,SU',
    'FREQ=MONTHLY;BYMONTHDAY=15,30',
    'FREQ=HOURLY',
  ])('leaves %s as it was written', (rrule) => {
    expect(fromRrule(rrule)).toMatchObject({ way: 'text', text: rrule });
    expect(toRrule(fromRrule(rrule))).toBe(rrule);
  });
});

test('a stored rule shown on the form and saved untouched is the same rule', () => {
  const input = createRule.parse({
    name: 'Rebuild',
    kind: 'rebuild',
    appliesTo: { carbCount: { min: 1 }, stroke: 'two', dockIds: ['5b0c3f5e-6f0e-4f0a-9a51-0d1f8f2b7a11'] },
    triggers: [
      { on: 'engine_hours', every: 25.5, first: 10, anchor: 'completed' },
      { on: 'outings', every: 40 },
      { on: 'calendar', rrule: 'FREQ=MONTHLY;BYDAY=1MO', start: '2026-01-05' },
    ],
    lead: { hours: 2.5 },
    window: { earlyHours: 2.5, lateDays: 3 },
    holdsUnit: false,
    labour: { baseMinutes: 60, perCarbMinutes: 45 },
  });
  const stored: Rule = {
    ...input,
    id: '5b0c3f5e-6f0e-4f0a-9a51-0d1f8f2b7a12',
    procedureId: null,
    revision: 1,
    unitCount: 0,
    createdAt: '',
    changedAt: '',
    changedBy: null,
    endedAt: null,
    endedBy: null,
    endReason: null,
  };
  expect(checkDraft(draftOf(stored, '2026-06-01')).input).toEqual(input);
});

test('what is no number stays as typed and is refused at its field', () => {
  const draft = newDraft('2026-06-01');
  const typed = {
    ...draft,
    name: 'Oil',
    triggers: [{ ...draft.triggers[0]!, every: 'fifty' }],
    carbMin: '2',
    carbMax: '1',
  };
  expect(toInput(typed).triggers).toEqual([
    { on: 'engine_hours', every: 'fifty', first: undefined, anchor: 'scheduled' },
  ]);
  const checked = checkDraft(typed);
  expect(Object.keys(checked.errors).sort()).toEqual(['appliesTo.carbCount.max', 'triggers.0.every']);
  expect(checked).toMatchObject({ input: null, schedule: null });
});
