import fc from 'fast-check';
import type { Kysely } from 'kysely';
import type { DB } from '@/db/tables';
import { changeRule } from '@/lib/actions/change-rule';
import { checkIn } from '@/lib/actions/check-in';
import { closeTask } from '@/lib/actions/close-task';
import { createDock } from '@/lib/actions/create-dock';
import { createModel } from '@/lib/actions/create-model';
import { createRule } from '@/lib/actions/create-rule';
import { createUnit } from '@/lib/actions/create-unit';
import { logReading } from '@/lib/actions/log-reading';
import { openTask } from '@/lib/actions/open-task';
import { recordBaseline } from '@/lib/actions/record-baseline';
import { refreshDue } from '@/lib/actions/refresh-due';
import { reverseClosure } from '@/lib/actions/reverse-closure';
import { voidReading } from '@/lib/actions/void-reading';
import { withdrawBaseline } from '@/lib/actions/withdraw-baseline';
import { Refusal } from '@/lib/errors';
import { changeRule as ruleInput } from '@/lib/schemas/rule';
import { asSystem } from './crew';

export const KINDS = ['hire', 'void', 'swap', 'close', 'reverse', 'baseline', 'withdraw', 'edit'] as const;
type Kind = (typeof KINDS)[number];
/** One thing that happens: hours after the one before, to one of three units, under one of three rules. */
export type Step = { kind: Kind; after: number; unit: number; rule: number; amount: number; pick: number };

const kind = fc.oneof(
  { weight: 12, arbitrary: fc.constant<Kind>('hire') },
  { weight: 6, arbitrary: fc.constant<Kind>('close') },
  { weight: 5, arbitrary: fc.constantFrom(...KINDS) },
);

/** Histories of 200 steps. */
export const anyHistory: fc.Arbitrary<Step[]> = fc.array(
  fc.record({
    kind,
    after: fc.integer({ min: 2, max: 60 }),
    unit: fc.nat(2),
    rule: fc.nat(2),
    amount: fc.integer({ min: 1, max: 20 }),
    pick: fc.nat(1000),
  }),
  { minLength: 200, maxLength: 200 },
);

export type Fleet = { db: Kysely<DB>; dockId: string; unitIds: string[]; ruleIds: string[] };

const CALENDARS = [
  'FREQ=WEEKLY;INTERVAL=3',
  'FREQ=MONTHLY',
  'FREQ=MONTHLY;BYMONTHDAY=15,-1',
  'FREQ=DAILY;INTERVAL=25',
];
const ANCHORS = ['scheduled', 'completed'] as const;

/** A rule at random: by hours, by outings and by the calendar, or by some of them. */
function writeRule(name: string, dockId: string, { amount, pick }: Pick<Step, 'amount' | 'pick'>) {
  const anchor = ANCHORS[pick % 2]!;
  const triggers = [
    { on: 'engine_hours' as const, every: 4 + amount, anchor },
    { on: 'outings' as const, every: 3 + (amount % 9), first: pick % 7, anchor },
    { on: 'calendar' as const, rrule: CALENDARS[pick % 4]!, start: '2025-12-31', anchor },
  ].filter((_, index) => pick % 8 === 0 || ((pick % 8) & (1 << index)) !== 0);
  return ruleInput.parse({
    ...{ name, kind: 'service', appliesTo: { dockIds: [dockId] }, triggers, holdsUnit: pick % 3 !== 0 },
    lead: { hours: amount % 4, outings: amount % 3, days: amount % 5 },
    window: {
      earlyHours: amount % 4,
      lateHours: pick % 4,
      earlyOutings: amount % 2,
      earlyDays: 2,
      lateDays: pick % 4,
    },
  });
}

let opened = 0;

/** A dock of its own with three units and three rules, in a database that may hold others. */
export async function openFleet(db: Kysely<DB>): Promise<Fleet> {
  const name = `Pier ${(opened += 1)}`;
  const ctx = asSystem(db, '2026-01-01T15:00:00Z');
  const dockId = (await createDock(ctx, { name, timeZone: 'America/Chicago' })).id;
  const twin = { propulsion: 'jet', stroke: 'two', engines: 1, cylinders: 2, carbCount: 2 } as const;
  const modelId = (await createModel(ctx, { name, ...twin })).id;
  const [unitIds, ruleIds]: [string[], string[]] = [[], []];
  for (const index of [0, 1, 2]) {
    const rule = writeRule(`${name} rule ${index}`, dockId, { amount: 4 + index * 5, pick: index * 3 + 1 });
    ruleIds.push((await createRule(ctx, rule)).id);
    const unit = { fleetNumber: `${name}-${index}`, enteredServiceOn: '2026-01-01', engineHours: index * 12 };
    unitIds.push((await createUnit(ctx, { ...unit, outings: index * 5, modelId, dockId })).id);
  }
  await refreshDue(ctx, { unitIds });
  return { db, dockId, unitIds, ruleIds };
}

type Moment = { fleet: Fleet; now: Date; unitId: string; ruleId: string; step: Step };

/** Each in its own way; what cannot be is refused, and changes nothing. */
const HAPPENINGS: Record<Kind, (moment: Moment) => Promise<unknown>> = {
  hire: async ({ fleet, now, unitId, step }) =>
    checkIn(asSystem(fleet.db, now), {
      ...{ id: crypto.randomUUID(), unitId, confirmReason: 'Long hire' },
      hours: ((await shownTenths(fleet, unitId)) + step.amount) / 10,
    }),
  void: async ({ fleet, now, unitId, step }) => {
    const query = fleet.db.selectFrom('reading').select(['id', 'shown_tenths']).where('unit_id', '=', unitId);
    const reading = pickOne(
      await query.where('voided_at', 'is', null).orderBy('taken_at', 'desc').limit(4).execute(),
      step,
    );
    if (!reading) return;
    const hours = Math.max(0, reading.shown_tenths - (step.amount % 3)) / 10;
    await voidReading(asSystem(fleet.db, now), reading.id, {
      reason: 'Misread',
      ...(step.pick % 2 === 0 && { replacement: { hours } }),
      ...(step.pick % 3 === 0 && { outingHappened: false }),
    });
  },
  swap: async ({ fleet, now, unitId, step }) => {
    const oldFinal = (await shownTenths(fleet, unitId)) / 10;
    const newFirst = (step.pick % 50) / 10;
    const reading = { id: crypto.randomUUID(), unitId, hours: newFirst, meterSwap: { oldFinal, newFirst } };
    await logReading(asSystem(fleet.db, now), reading);
  },
  close: async ({ fleet, now, unitId, ruleId }) => {
    const open = fleet.db
      .selectFrom('task')
      .select('id')
      .where('unit_id', '=', unitId)
      .where('rule_id', '=', ruleId);
    const ctx = asSystem(fleet.db, now);
    const task =
      (await open.where('ended_at', 'is', null).executeTakeFirst()) ??
      (await openTask(ctx, { unitId, ruleId }));
    await closeTask(ctx, task.id, {});
  },
  reverse: async ({ fleet, now, unitId, step }) => {
    const query = fleet.db.selectFrom('closure').select('id').where('unit_id', '=', unitId);
    const closure = pickOne(
      await query.where('reversed_at', 'is', null).orderBy('closed_at').execute(),
      step,
    );
    if (closure) await reverseClosure(asSystem(fleet.db, now), closure.id, { reason: 'Wrong unit' });
  },
  baseline: async ({ fleet, now, unitId, ruleId, step }) => {
    const { engine_hours_tenths } = await meterOf(fleet, unitId);
    const closedOn = new Date(now.getTime() - (step.pick % 60) * 86_400_000).toISOString().slice(0, 10);
    const engineHours = Math.max(0, engine_hours_tenths - step.amount * 4) / 10;
    await recordBaseline(asSystem(fleet.db, now), unitId, {
      ruleId,
      closedOn,
      engineHours,
      note: 'Paper log',
    });
  },
  withdraw: async ({ fleet, now, unitId, step }) => {
    const query = fleet.db.selectFrom('baseline').select('id').where('unit_id', '=', unitId);
    const baseline = pickOne(
      await query.where('withdrawn_at', 'is', null).orderBy('recorded_at').execute(),
      step,
    );
    if (baseline) await withdrawBaseline(asSystem(fleet.db, now), unitId, baseline.id);
  },
  edit: async ({ fleet, now, ruleId, step }) => {
    const { name } = await fleet.db
      .selectFrom('rule')
      .select('name')
      .where('id', '=', ruleId)
      .executeTakeFirstOrThrow();
    await changeRule(asSystem(fleet.db, now), ruleId, writeRule(name, fleet.dockId, step));
  },
};

const pickOne = <T>(items: T[], { pick }: Step): T | undefined => items[pick % Math.max(1, items.length)];

const meterOf = ({ db }: Fleet, unitId: string) =>
  db.selectFrom('live_meter').selectAll().where('unit_id', '=', unitId).executeTakeFirstOrThrow();

const shownTenths = async (fleet: Fleet, unitId: string) => (await meterOf(fleet, unitId)).shown_tenths;

/**
 * Lets a history happen, the worker's refresh after each step for the units it touches. Answers which kinds of steps
 * were accepted and when it ended; `look` is called after each accepted one.
 */
export async function live(
  fleet: Fleet,
  history: readonly Step[],
  look: (step: Step, now: Date, unitId: string) => Promise<void> = async () => undefined,
): Promise<{ accepted: Kind[]; now: Date }> {
  let now = new Date('2026-01-02T15:00:00Z');
  const accepted: Kind[] = [];
  for (const step of history) {
    now = new Date(now.getTime() + step.after * 3_600_000);
    const [unitId, ruleId] = [fleet.unitIds[step.unit]!, fleet.ruleIds[step.rule]!];
    try {
      await HAPPENINGS[step.kind]({ fleet, now, unitId, ruleId, step });
    } catch (error) {
      if (error instanceof Refusal) continue;
      throw error;
    }
    accepted.push(step.kind);
    await refreshDue(asSystem(fleet.db, now), { unitIds: step.kind === 'edit' ? fleet.unitIds : [unitId] });
    await look(step, now, unitId);
  }
  return { accepted, now };
}
