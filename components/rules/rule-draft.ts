import type { CalendarDay } from '@/lib/domain/calendar-day';
import type { Rule } from '@/lib/schemas/rule';
import { createRule, ruleSchedule, type CreateRule, type ScheduleShape } from '@/lib/schemas/rule';
import type { TriggerShape } from '@/lib/schemas/trigger';
import { fromRrule, NEW_CALENDAR, toRrule, type CalendarDraft } from './calendar-draft';

/** A trigger as it is typed: numbers are still text. `key` tells two apart while they move. */
export type TriggerDraft = {
  key: number;
  on: TriggerShape['on'];
  every: string;
  first: string;
  start: string;
  anchor: TriggerShape['anchor'];
  calendar: CalendarDraft;
};

const AMOUNTS = [
  'leadHours',
  'leadOutings',
  'leadDays',
  'earlyHours',
  'lateHours',
  'earlyOutings',
  'lateOutings',
  'earlyDays',
  'lateDays',
  'baseMinutes',
  'perCarbMinutes',
  'perEngineMinutes',
] as const;
export type AmountName = (typeof AMOUNTS)[number];

/** A part that the work takes, as it is typed. */
export type PartDraft = {
  key: number;
  partId: string;
  quantity: string;
  per: CreateRule['parts'][number]['per'];
};

/** A rule as it is typed. */
export type RuleDraft = {
  name: string;
  kind: CreateRule['kind'];
  triggers: TriggerDraft[];
  amounts: Record<AmountName, string>;
  modelIds: string[];
  dockIds: string[];
  propulsion: string;
  stroke: string;
  carbMin: string;
  carbMax: string;
  holdsUnit: boolean;
  /** Empty for none. */
  procedureId: string;
  parts: PartDraft[];
  wantsSecondPerson: boolean;
  wantsTestRide: boolean;
};

export function newTrigger(key: number, on: TriggerShape['on'], today: CalendarDay): TriggerDraft {
  return { key, on, every: '', first: '', start: today, anchor: 'scheduled', calendar: NEW_CALENDAR };
}

/** The form of a rule nobody has written yet. */
export function newDraft(today: CalendarDay): RuleDraft {
  return {
    name: '',
    kind: 'service',
    triggers: [newTrigger(0, 'engine_hours', today)],
    amounts: Object.fromEntries(AMOUNTS.map((name) => [name, '0'])) as Record<AmountName, string>,
    modelIds: [],
    dockIds: [],
    propulsion: '',
    stroke: '',
    carbMin: '',
    carbMax: '',
    holdsUnit: true,
    procedureId: '',
    parts: [],
    wantsSecondPerson: false,
    wantsTestRide: false,
  };
}

/** The form of a rule as it is stored. */
export function draftOf(rule: Rule, today: CalendarDay): RuleDraft {
  const { lead, window, labour, appliesTo } = rule;
  const amounts = {
    leadHours: lead.hours,
    leadOutings: lead.outings,
    leadDays: lead.days,
    ...window,
    ...labour,
  };
  return {
    name: rule.name,
    kind: rule.kind,
    triggers: rule.triggers.map((trigger, key) => triggerDraftOf(trigger, key, today)),
    amounts: Object.fromEntries(AMOUNTS.map((name) => [name, String(amounts[name])])) as RuleDraft['amounts'],
    modelIds: appliesTo.modelIds ?? [],
    dockIds: appliesTo.dockIds ?? [],
    propulsion: appliesTo.propulsion ?? '',
    stroke: appliesTo.stroke ?? '',
    carbMin: String(appliesTo.carbCount?.min ?? ''),
    carbMax: String(appliesTo.carbCount?.max ?? ''),
    holdsUnit: rule.holdsUnit,
    procedureId: rule.procedureId ?? '',
    parts: rule.parts.map((part, key) => ({ ...part, key, quantity: String(part.quantity) })),
    wantsSecondPerson: rule.wantsSecondPerson,
    wantsTestRide: rule.wantsTestRide,
  };
}

function triggerDraftOf(trigger: TriggerShape, key: number, today: CalendarDay): TriggerDraft {
  const draft = { ...newTrigger(key, trigger.on, today), anchor: trigger.anchor };
  return trigger.on === 'calendar'
    ? { ...draft, start: trigger.start, calendar: fromRrule(trigger.rrule) }
    : { ...draft, every: String(trigger.every), first: String(trigger.first ?? '') };
}

/** What was typed as the API takes it; what is no number stays as typed, for the schema to refuse at its place. */
export function toInput(draft: RuleDraft) {
  const { amounts } = draft;
  const amount = (name: AmountName) => numberOf(amounts[name]) ?? 0;
  const carbs = { min: numberOf(draft.carbMin), max: numberOf(draft.carbMax) };
  return {
    name: draft.name,
    kind: draft.kind,
    appliesTo: {
      ...(draft.modelIds.length > 0 && { modelIds: draft.modelIds }),
      ...(draft.dockIds.length > 0 && { dockIds: draft.dockIds }),
      ...(draft.propulsion && { propulsion: draft.propulsion }),
      ...(draft.stroke && { stroke: draft.stroke }),
      ...((carbs.min !== undefined || carbs.max !== undefined) && { carbCount: carbs }),
    },
    triggers: draft.triggers.map(toTriggerInput),
    lead: { hours: amount('leadHours'), outings: amount('leadOutings'), days: amount('leadDays') },
    window: {
      earlyHours: amount('earlyHours'),
      lateHours: amount('lateHours'),
      earlyOutings: amount('earlyOutings'),
      lateOutings: amount('lateOutings'),
      earlyDays: amount('earlyDays'),
      lateDays: amount('lateDays'),
    },
    holdsUnit: draft.holdsUnit,
    ...(draft.procedureId && { procedureId: draft.procedureId }),
    parts: draft.parts.map(({ partId, quantity, per }) => ({ partId, quantity: numberOf(quantity), per })),
    wantsSecondPerson: draft.wantsSecondPerson,
    wantsTestRide: draft.wantsTestRide,
    labour: {
      baseMinutes: amount('baseMinutes'),
      perCarbMinutes: amount('perCarbMinutes'),
      perEngineMinutes: amount('perEngineMinutes'),
    },
  };
}

function toTriggerInput({ on, every, first, anchor, start, calendar }: TriggerDraft) {
  if (on === 'calendar') return { on, rrule: toRrule(calendar), start, anchor };
  return { on, every: numberOf(every), first: numberOf(first), anchor };
}

function numberOf(text: string): number | string | undefined {
  const trimmed = text.trim();
  if (trimmed === '') return undefined;
  return /^-?\d+(\.\d+)?$/.test(trimmed) ? Number(trimmed) : trimmed;
}

/**
 * What the server would say: the rule when nothing is wrong, its schedule when that much is right, and what is
 * wrong by path.
 */
export type CheckedDraft = {
  input: CreateRule | null;
  schedule: ScheduleShape | null;
  errors: Record<string, string>;
};

/** The same check as the server's, of what stands on the form. */
export function checkDraft(draft: RuleDraft): CheckedDraft {
  const input = toInput(draft);
  const parsed = createRule.safeParse(input);
  if (parsed.success) return { input: parsed.data, schedule: parsed.data, errors: {} };
  const { triggers, lead, window } = input;
  const errors: Record<string, string> = {};
  for (const { path, message } of parsed.error.issues) errors[path.join('.')] ??= message;
  return { input: null, schedule: ruleSchedule.safeParse({ triggers, lead, window }).data ?? null, errors };
}

/** The minutes of work as typed, or null while one of them is no whole number. */
export function labourOf({ amounts }: RuleDraft): CreateRule['labour'] | null {
  const [baseMinutes, perCarbMinutes, perEngineMinutes] = [
    amounts.baseMinutes,
    amounts.perCarbMinutes,
    amounts.perEngineMinutes,
  ].map((text) => (/^\d*$/.test(text.trim()) ? Number(text) : NaN)) as [number, number, number];
  const labour = { baseMinutes, perCarbMinutes, perEngineMinutes };
  return Object.values(labour).some(Number.isNaN) ? null : labour;
}
