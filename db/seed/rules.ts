import { createRule, type CreateRule } from '@/lib/schemas/rule';

/** What the rules of the demo are called here; their names are for people. */
export const RULE_KEYS = [
  'commissioning',
  'carbInspection',
  'carbRebuild',
  'popOff',
  'plugs',
  'oil',
  'pump',
  'cables',
  'lanyard',
  'safetyGear',
  'fuel',
  'layUp',
  'battery',
] as const;
export type RuleKey = (typeof RULE_KEYS)[number];

/** A rule of the demo follows the starter procedure of its own name, else this one. */
export const PROCEDURE_NAMES: Partial<Record<RuleKey, string>> = {
  popOff: 'Pop-off test',
  layUp: 'Winter lay-up',
};

type Given = (typeof createRule)['_zod']['input'];
/** A rule as the API takes it, but for what depends on the year and the docks. */
type Duty = Omit<Given, 'appliesTo' | 'triggers'> & {
  appliesTo?: Given['appliesTo'];
  triggers: (Exclude<Given['triggers'][number], { on: 'calendar' }> | CalendarDuty)[];
};
type CalendarDuty = { on: 'calendar'; rrule: string; anchor?: 'scheduled' | 'completed' };

const HALF_YEARLY = 'FREQ=MONTHLY;INTERVAL=6';

/**
 * The duties of the demo's fleet. The intervals are what many hire fleets do, without a published source; the
 * engine maker's manual comes before them.
 */
const DUTIES: Record<RuleKey, Duty> = {
  commissioning: {
    name: 'Pre-season commissioning',
    kind: 'inspection',
    triggers: [{ on: 'calendar', rrule: 'FREQ=YEARLY;BYMONTH=2;BYMONTHDAY=20' }],
    lead: { days: 21 },
    window: { earlyDays: 30, lateDays: 9 },
    labour: { baseMinutes: 90, perEngineMinutes: 30 },
  },
  carbInspection: {
    name: 'Carburettor inspection',
    kind: 'inspection',
    appliesTo: { carbCount: { min: 1 } },
    triggers: [{ on: 'engine_hours', every: 50 }],
    lead: { hours: 8 },
    window: { earlyHours: 5, lateHours: 5 },
    holdsUnit: false,
    labour: { baseMinutes: 20, perCarbMinutes: 15 },
  },
  carbRebuild: {
    name: 'Carburettor rebuild',
    kind: 'rebuild',
    appliesTo: { carbCount: { min: 1 } },
    triggers: [{ on: 'engine_hours', every: 100 }],
    lead: { hours: 15 },
    window: { earlyHours: 10, lateHours: 10 },
    labour: { baseMinutes: 60, perCarbMinutes: 45 },
  },
  popOff: {
    name: 'Pop-off pressure and mixture check',
    kind: 'inspection',
    appliesTo: { stroke: 'two', carbCount: { min: 1 } },
    triggers: [{ on: 'engine_hours', every: 75 }],
    lead: { hours: 8 },
    window: { earlyHours: 5, lateHours: 10 },
    holdsUnit: false,
    labour: { baseMinutes: 15, perCarbMinutes: 20 },
  },
  plugs: {
    name: 'Spark plugs',
    kind: 'service',
    appliesTo: { stroke: 'two' },
    triggers: [{ on: 'engine_hours', every: 50 }],
    lead: { hours: 6 },
    window: { earlyHours: 5, lateHours: 10 },
    holdsUnit: false,
    labour: { baseMinutes: 25 },
  },
  oil: {
    name: 'Engine oil and filter',
    kind: 'service',
    appliesTo: { stroke: 'four' },
    triggers: [
      { on: 'engine_hours', every: 50, anchor: 'completed' },
      { on: 'calendar', rrule: HALF_YEARLY, anchor: 'completed' },
    ],
    lead: { hours: 6, days: 14 },
    window: { lateHours: 5, lateDays: 14 },
    labour: { baseMinutes: 20, perEngineMinutes: 25 },
  },
  pump: {
    name: 'Jet pump and impeller',
    kind: 'inspection',
    appliesTo: { propulsion: 'jet' },
    triggers: [
      { on: 'outings', every: 100, anchor: 'completed' },
      { on: 'engine_hours', every: 60, anchor: 'completed' },
    ],
    lead: { hours: 6, outings: 10 },
    window: { lateHours: 6, lateOutings: 10 },
    labour: { baseMinutes: 45 },
  },
  cables: {
    name: 'Steering and throttle cables',
    kind: 'inspection',
    triggers: [{ on: 'calendar', rrule: HALF_YEARLY }],
    lead: { days: 14 },
    window: { earlyDays: 14, lateDays: 14 },
    labour: { baseMinutes: 30 },
  },
  lanyard: {
    name: 'Cut-off lanyard and switch',
    kind: 'inspection',
    triggers: [{ on: 'outings', every: 25, anchor: 'completed' }],
    lead: { outings: 4 },
    labour: { baseMinutes: 10 },
  },
  safetyGear: {
    name: 'Fire extinguisher and safety gear',
    kind: 'inspection',
    triggers: [{ on: 'calendar', rrule: 'FREQ=YEARLY' }],
    lead: { days: 21 },
    window: { earlyDays: 30 },
    labour: { baseMinutes: 20 },
  },
  fuel: {
    name: 'Fuel hoses, filter and tank',
    kind: 'inspection',
    appliesTo: { propulsion: 'jet' },
    triggers: [{ on: 'calendar', rrule: 'FREQ=YEARLY', anchor: 'completed' }],
    lead: { days: 28 },
    window: { lateDays: 30 },
    labour: { baseMinutes: 50 },
  },
  layUp: {
    name: 'Winter lay-up preparation',
    kind: 'service',
    triggers: [{ on: 'calendar', rrule: 'FREQ=YEARLY;BYMONTH=11;BYMONTHDAY=25' }],
    lead: { days: 14 },
    window: { earlyDays: 20, lateDays: 14 },
    holdsUnit: false,
    labour: { baseMinutes: 60, perCarbMinutes: 10, perEngineMinutes: 20 },
  },
  battery: {
    name: 'Battery and charging check',
    kind: 'service',
    triggers: [{ on: 'calendar', rrule: HALF_YEARLY, anchor: 'completed' }],
    lead: { days: 14 },
    window: { lateDays: 21 },
    holdsUnit: false,
    labour: { baseMinutes: 15 },
  },
};

/** The duties as rules; `year` is that of the first season shown. Only a dock with a season lays its units up. */
export function listDemoRules(year: number, seasonalDockId: string): Record<RuleKey, CreateRule> {
  const start = `${year}-01-01`;
  const toRule = (key: RuleKey): CreateRule => {
    const { appliesTo = {}, triggers, ...duty } = DUTIES[key];
    return createRule.parse({
      ...duty,
      appliesTo: key === 'layUp' ? { ...appliesTo, dockIds: [seasonalDockId] } : appliesTo,
      triggers: triggers.map((trigger) => (trigger.on === 'calendar' ? { ...trigger, start } : trigger)),
    });
  };
  return Object.fromEntries(RULE_KEYS.map((key) => [key, toRule(key)])) as Record<RuleKey, CreateRule>;
}
