import { createRule, type CreateRule } from '@/lib/schemas/rule';
import type { OracleRule, OracleTrigger, Slack } from './oracle';

type Craft = { carbs: number; dock: number };
/** A rule twice over: as the API takes it, and as the oracle does, with the units it is for. */
export type SeasonRule = { input: CreateRule; oracle: OracleRule; fits(craft: Craft): boolean };

const NONE: Slack = { hours: 0, outings: 0, days: 0 };
type Written = {
  name: string;
  triggers: OracleTrigger[];
  lead?: Partial<Slack>;
  early?: Partial<Slack>;
  late?: Partial<Slack>;
  holds?: boolean;
  appliesTo?: CreateRule['appliesTo'];
  fits?(craft: Craft): boolean;
};

function toInput(trigger: OracleTrigger) {
  if (trigger.on !== 'hours') return trigger;
  const { every, first, anchor } = trigger;
  return { on: 'engine_hours', every: every / 10, ...(first !== undefined && { first: first / 10 }), anchor };
}

function twice({ fits = () => true, appliesTo = {}, holds = true, ...written }: Written): SeasonRule {
  const [lead, early, late] = [written.lead, written.early, written.late].map((s) => ({ ...NONE, ...s })) as [
    Slack,
    Slack,
    Slack,
  ];
  const input = createRule.parse({
    name: written.name,
    kind: 'service',
    appliesTo,
    triggers: written.triggers.map(toInput),
    lead: { ...lead, hours: lead.hours / 10 },
    window: {
      ...{ earlyHours: early.hours / 10, earlyOutings: early.outings, earlyDays: early.days },
      ...{ lateHours: late.hours / 10, lateOutings: late.outings, lateDays: late.days },
    },
    holdsUnit: holds,
  });
  return { input, oracle: { triggers: written.triggers, lead, early, late, holds }, fits };
}

const [scheduled, completed] = ['scheduled', 'completed'] as const;

/** Rules of every kind of trigger, alone and together, with and without windows, leads and holds. */
export function seasonRules(secondDockId: string): SeasonRule[] {
  const rules: Written[] = [
    {
      name: 'Every 20 h, give or take 2 h',
      triggers: [{ on: 'hours', every: 200, anchor: scheduled }],
      ...{ lead: { hours: 30 }, early: { hours: 20 }, late: { hours: 20 } },
    },
    {
      name: 'Every 25 outings, first at 10, at once',
      triggers: [{ on: 'outings', every: 25, first: 10, anchor: scheduled }],
      ...{ lead: { outings: 4 }, early: { outings: 3 } },
    },
    {
      name: '50 h or two months after it was done',
      triggers: [
        { on: 'hours', every: 500, anchor: completed },
        { on: 'calendar', rrule: 'FREQ=MONTHLY;INTERVAL=2', start: '2010-12-31', anchor: completed },
      ],
      ...{ lead: { hours: 50, days: 10 }, late: { days: 5 } },
    },
    {
      name: 'Every sixth Tuesday',
      triggers: [
        { on: 'calendar', rrule: 'FREQ=WEEKLY;INTERVAL=6;BYDAY=TU', start: '2011-01-04', anchor: scheduled },
      ],
      ...{ lead: { days: 5 }, early: { days: 3 }, late: { days: 4 }, holds: false },
    },
    {
      name: 'On the 31st, at the second dock',
      appliesTo: { dockIds: [secondDockId] },
      fits: ({ dock }) => dock === 1,
      triggers: [{ on: 'calendar', rrule: 'FREQ=MONTHLY', start: '2011-01-31', anchor: scheduled }],
      ...{ lead: { days: 6 }, early: { days: 5 }, late: { days: 6 } },
    },
    {
      name: '60 outings, 45 h or the middle of April',
      appliesTo: { carbCount: { min: 2 } },
      fits: ({ carbs }) => carbs >= 2,
      triggers: [
        { on: 'outings', every: 60, anchor: scheduled },
        { on: 'hours', every: 450, first: 300, anchor: scheduled },
        {
          on: 'calendar',
          rrule: 'FREQ=YEARLY;BYMONTH=4;BYMONTHDAY=15',
          start: '2011-01-01',
          anchor: scheduled,
        },
      ],
      lead: { hours: 40, outings: 6, days: 14 },
      early: { hours: 50, outings: 6, days: 10 },
      late: { hours: 30, outings: 5, days: 10 },
    },
    {
      name: '40 days after it was done',
      triggers: [{ on: 'calendar', rrule: 'FREQ=DAILY;INTERVAL=40', start: '2011-01-10', anchor: completed }],
      ...{ lead: { days: 4 }, late: { days: 3 }, holds: false },
    },
  ];
  return rules.map(twice);
}
