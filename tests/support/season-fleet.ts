import { sql, type Kysely } from 'kysely';
import type { DB } from '@/db/tables';
import { checkIn } from '@/lib/actions/check-in';
import { checkOut } from '@/lib/actions/check-out';
import { clearDefect } from '@/lib/actions/clear-defect';
import { closeTask } from '@/lib/actions/close-task';
import { createDock } from '@/lib/actions/create-dock';
import { createModel } from '@/lib/actions/create-model';
import { createRule } from '@/lib/actions/create-rule';
import { createUnit } from '@/lib/actions/create-unit';
import { openTask } from '@/lib/actions/open-task';
import { recordBaseline } from '@/lib/actions/record-baseline';
import { refreshDue } from '@/lib/actions/refresh-due';
import { voidReading } from '@/lib/actions/void-reading';
import { chanceOf, type Chance } from '@/db/seed/random';
import { asSystem } from './crew';
import { judgeDue, meterOf, type OracleClosing, type OraclePoint } from './oracle';
import { seasonRules, type SeasonRule } from './season-rules';

/** A unit as the oracle keeps its books: tallies of its own, never read back from the database. */
export type SeasonUnit = {
  id: string;
  fleetNumber: string;
  entered: string;
  hours: number;
  outings: number;
  rules: { id: string; rule: SeasonRule; closings: OracleClosing[]; points: OraclePoint[] }[];
  defects: Set<string>;
};
export type Fleet = { db: Kysely<DB>; units: SeasonUnit[]; chance: Chance };

const FIRST_DAY = '2011-01-01';

/** Forty units of two models at two docks, a quarter of them with a past. */
export async function openFleet(db: Kysely<DB>): Promise<Fleet> {
  const ctx = asSystem(db, `${FIRST_DAY}T12:00:00Z`);
  const docks = [
    await createDock(ctx, { name: 'East pier', timeZone: 'America/New_York' }),
    await createDock(ctx, { name: 'Lake pier', timeZone: 'America/Chicago' }),
  ];
  const jet = { propulsion: 'jet', stroke: 'two', engines: 1, cylinders: 2 } as const;
  const models = [
    await createModel(ctx, { ...jet, name: 'Single', carbCount: 1 }),
    await createModel(ctx, { ...jet, name: 'Twin', carbCount: 2 }),
  ];
  const rules: { id: string; rule: SeasonRule }[] = [];
  for (const rule of seasonRules(docks[1]!.id))
    rules.push({ id: (await createRule(ctx, rule.input)).id, rule });
  const units: SeasonUnit[] = [];
  for (let index = 0; index < 40; index += 1) {
    const [dock, model] = [index % 2, index % 3 === 0 ? 0 : 1];
    const hours = index % 4 === 0 ? 1000 + index * 10 : 0;
    const entered = index % 4 === 0 ? '2009-05-20' : FIRST_DAY;
    const fleetNumber = `S-${index + 1}`;
    const unit = await createUnit(ctx, {
      ...{ fleetNumber, enteredServiceOn: entered, engineHours: hours / 10, outings: hours / 10 },
      ...{ modelId: models[model]!.id, dockId: docks[dock]!.id },
    });
    const own = rules.filter(({ rule }) => rule.fits({ carbs: model + 1, dock }));
    const record = {
      id: unit.id,
      fleetNumber,
      entered,
      hours,
      outings: hours / 10,
      defects: new Set<string>(),
    };
    units.push({ ...record, rules: own.map((entry) => ({ ...entry, closings: [], points: [] })) });
    if (hours > 0) await recordPast(db, units.at(-1)!, ctx.now);
  }
  for (const unit of units) judge(unit);
  await refreshDue(ctx, { unitIds: units.map(({ id }) => id) });
  return { db, units, chance: chanceOf('two seasons') };
}

async function recordPast(db: Kysely<DB>, unit: SeasonUnit, now: Date): Promise<void> {
  for (const { id, closings } of unit.rules.slice(0, 2)) {
    const closing = { on: '2010-11-30', hours: unit.hours - 40, outings: unit.outings - 4 };
    closings.push(closing);
    await recordBaseline(asSystem(db, now), unit.id, {
      ...{ ruleId: id, closedOn: closing.on, engineHours: closing.hours / 10, outings: closing.outings },
      note: 'Paper log',
    });
  }
}

/** Has the oracle judge the unit anew, after a closing. */
function judge(unit: SeasonUnit): void {
  for (const entry of unit.rules) {
    const { oracle } = entry.rule;
    entry.points = oracle.triggers.map((trigger) => judgeDue(oracle, trigger, unit.entered, entry.closings));
  }
}

/** The names of the rules that hold a unit on a day, by the oracle. */
export function heldBy(unit: SeasonUnit, today: string): string[] {
  return unit.rules.flatMap(({ rule, points }) => {
    const { oracle, input } = rule;
    const late = points.some((point, i) => meterOf(oracle.triggers[i]!, unit, today) >= point.overdueFrom);
    return oracle.holds && late ? [input.name] : [];
  });
}

const at = (day: string, minute: number) => new Date(Date.parse(`${day}T12:30:00Z`) + minute * 60_000);

/** The mechanic's morning: repairs, open tasks that come to their turn, and now and then work far too early. */
export async function workMorning({ db, units, chance }: Fleet, day: string): Promise<void> {
  const open = await sql<{ id: string; unit_id: string; rule_id: string | null }>`
    select t.id, t.unit_id, t.rule_id from task t join unit u on u.id = t.unit_id left join rule r on r.id = t.rule_id
     where t.ended_at is null order by u.fleet_number, r.name`.execute(db);
  for (const unit of units) {
    const ctx = asSystem(db, at(day, 0));
    for (const defect of unit.defects) {
      if (!chance.happens(0.5)) continue;
      await clearDefect(ctx, defect, { note: 'Put right' });
      unit.defects.delete(defect);
    }
    const held = heldBy(unit, day).length > 0;
    const tasks = open.rows.filter(({ unit_id }) => unit_id === unit.id);
    for (const task of tasks)
      if (task.rule_id && chance.happens(held ? 0.12 : 0.07))
        await close(db, unit, task.rule_id, task.id, day);
    const early = chance.pick(unit.rules);
    const isOpen = tasks.some(({ rule_id }) => rule_id === early.id);
    if (isOpen || !chance.happens(0.002)) continue;
    const task = await openTask(ctx, { unitId: unit.id, ruleId: early.id });
    await close(db, unit, early.id, task.id, day);
  }
}

async function close(db: Kysely<DB>, unit: SeasonUnit, ruleId: string, taskId: string, day: string) {
  await closeTask(asSystem(db, at(day, 5)), taskId, {});
  const { hours, outings, rules } = unit;
  rules.find(({ id }) => id === ruleId)!.closings.push({ on: day, hours, outings });
  judge(unit);
}

/** Hires a day's outings out, unit by unit in turn. A held unit goes out only where nobody asks, one time in three. */
export async function hireOut(fleet: Fleet, day: string, count: number): Promise<void> {
  const { units, chance } = fleet;
  const queues = new Map<SeasonUnit, (() => Promise<void>)[]>();
  for (let n = 0; n < count; n += 1) {
    const unit = chance.pick(units);
    const queue = queues.get(unit) ?? [];
    const minute = 90 + queue.length * 110;
    if (minute > 600) continue;
    const plan = {
      minute,
      tenths: chance.whole(2, 14),
      asks: chance.happens(0.2),
      sneaks: chance.happens(0.33),
    };
    const odd = { misread: chance.happens(0.004), defect: chance.happens(0.004) };
    const id = chance.uuid();
    queues.set(unit, [...queue, () => goOut(fleet.db, unit, day, { id, ...plan, ...odd })]);
  }
  await Promise.all(
    [...queues.values()].map(async (queue) => {
      for (const outing of queue) await outing();
    }),
  );
}

type Outing = {
  id: string;
  minute: number;
  tenths: number;
  asks: boolean;
  sneaks: boolean;
  misread: boolean;
  defect: boolean;
};

async function goOut(db: Kysely<DB>, unit: SeasonUnit, day: string, outing: Outing): Promise<void> {
  const held = heldBy(unit, day).length > 0 || unit.defects.size > 0;
  const leaves = asSystem(db, at(day, outing.minute));
  const hire = { id: outing.id.replace(/^./, 'a'), unitId: unit.id };
  if (held && !outing.sneaks) {
    if (!outing.asks) return;
    const refused: unknown = await checkOut(leaves, hire).then(
      () => null,
      (error: unknown) => error,
    );
    if ((refused as { code?: string } | null)?.code !== 'unit_held')
      throw new Error(`${unit.fleetNumber} is held on ${day}, and was not refused`, { cause: refused });
    return;
  }
  if (outing.asks && !held) await checkOut(leaves, hire);
  const back = asSystem(db, at(day, outing.minute + 90));
  const shown = unit.hours + outing.tenths;
  const reading = { id: outing.id.replace(/^./, 'b'), unitId: unit.id, confirmReason: 'Looked twice' };
  const defect = { title: 'Steering stiff', holdsUnit: true };
  const hours = (shown + (outing.misread ? 2 : 0)) / 10;
  const kept = await checkIn(back, { ...reading, hours, ...(outing.defect && { defect }) });
  if (outing.misread)
    await voidReading(asSystem(db, at(day, outing.minute + 91)), reading.id, {
      reason: 'Misread',
      replacement: { hours: shown / 10 },
    });
  unit.hours = shown;
  unit.outings += 1;
  if (kept.defectId) unit.defects.add(kept.defectId);
}
