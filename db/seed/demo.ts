import { sql, type Kysely } from 'kysely';
import type { DB } from '@/db/tables';
import { createDock } from '@/lib/actions/create-dock';
import { createModel } from '@/lib/actions/create-model';
import { createRule } from '@/lib/actions/create-rule';
import { createUnit } from '@/lib/actions/create-unit';
import { listProcedures } from '@/lib/actions/list-procedures';
import { recordBaseline } from '@/lib/actions/record-baseline';
import { refreshDue } from '@/lib/actions/refresh-due';
import { setUp } from '@/lib/actions/set-up';
import type { Context } from '@/lib/context';
import { SYSTEM } from '@/lib/domain/access';
import { addDays, localDay, partsOfDay, type CalendarDay } from '@/lib/domain/calendar-day';
import { ruleApplies } from '@/lib/domain/rule';
import type { Dock } from '@/lib/schemas/dock';
import type { Model } from '@/lib/schemas/model';
import type { Rule } from '@/lib/schemas/rule';
import { assess, instantOf, type Book } from './book';
import { DOCKS, OPERATOR_NAME } from './docks';
import { writeTheDay } from './finish';
import { writeHistory } from './history';
import { MODELS } from './models';
import { addParts, partsOf, stockDocks } from './parts';
import { addCrew, DEMO_MANAGER, DEMO_PASSWORD, type Crew } from './people';
import { chanceOf } from './random';
import { listDemoRules, PROCEDURE_NAMES, RULE_KEYS, type RuleKey } from './rules';
import { planOutings } from './season';
import { listDemoUnits, type DemoUnit } from './units';

/** Two years: not a day more, or a look at safety gear two years before the end would be of the future then. */
const HISTORY_DAYS = 730;
/** Units whose history is written at the same time. */
const AT_ONCE = 5;

/**
 * Loads the demo into a migrated, empty database: an invented operator with two years of outings and care that end
 * at `now`. All of it goes through the actions, each at its own instant, and follows from `now` alone.
 */
export async function seedDemo(
  db: Kysely<DB>,
  { now, progress }: { now: Date; progress(line: string): void },
): Promise<void> {
  const end = localDay(now, DOCKS[0]!.input.timeZone);
  const start = addDays(end, -HISTORY_DAYS);
  const begin: Context = { db, actor: SYSTEM, now: instantOf(DOCKS[0]!.input.timeZone, start, 5 * 60) };
  const house = await furnish(begin, start);
  progress(`${house.docks.length} docks, ${house.models.length} models, ${house.rules.size} rules`);
  const units = listDemoUnits(start, end);
  const books: Book[] = [];
  let done = 0;
  await inTurn(units, async (unit) => {
    books.push(await writeUnit(db, house, unit, now));
    done += 1;
    if (done % 10 === 0 || done === units.length)
      progress(`${done} of ${units.length} units have their two seasons`);
  });
  books.sort((a, b) => (a.fleetNumber < b.fleetNumber ? -1 : 1));
  const dockIds = house.docks.map(({ id }) => id);
  await stockDocks({ ...begin, now }, { ids: house.parts, dockIds, crews: house.crews });
  await writeTheDay(books, dockIds, now);
  await settle(db, books, now);
  progress('the fleet is as it stands today');
}

type House = {
  docks: Dock[];
  models: Model[];
  crews: Crew[];
  rules: Map<string, Rule>;
  byKey: Record<RuleKey, Rule>;
  /** Ids by number. */
  parts: ReadonlyMap<string, string>;
};

async function furnish(ctx: Context, start: CalendarDay): Promise<House> {
  const manager = { ...DEMO_MANAGER, password: DEMO_PASSWORD };
  const [first, ...others] = DOCKS.map(({ input }) => input);
  const opened = await setUp(ctx, { operatorName: OPERATOR_NAME, dock: first!, manager });
  const docks = [opened.dock];
  for (const dock of others) docks.push(await createDock(ctx, dock));
  const models: Model[] = [];
  for (const { input } of MODELS) models.push(await createModel(ctx, input));
  const crews = await addCrew(
    ctx.db,
    opened.manager,
    docks.map(({ id }) => id),
    ctx.now,
  );
  const procedures = new Map((await listProcedures(ctx)).map(({ id, name }) => [name, id]));
  const parts = await addParts({ ...ctx, actor: crews[0]!.manager });
  const byKey = {} as Record<RuleKey, Rule>;
  const inputs = listDemoRules(partsOfDay(start).year, docks.at(-1)!.id);
  for (const key of RULE_KEYS)
    byKey[key] = await createRule(
      { ...ctx, actor: crews[0]!.manager },
      {
        ...inputs[key],
        procedureId: procedures.get(PROCEDURE_NAMES[key] ?? inputs[key].name) ?? null,
        parts: partsOf(key, parts),
      },
    );
  const rules = new Map(Object.values(byKey).map((rule) => [rule.id, rule]));
  return { docks, models, crews, rules, byKey, parts };
}

/** Adds a unit with its past, and writes its history. */
async function writeUnit(db: Kysely<DB>, house: House, demo: DemoUnit, now: Date): Promise<Book> {
  const dock = house.docks[demo.dock]!;
  const crew = house.crews[demo.dock]!;
  const added = instantOf(dock.timeZone, demo.addedOn, 6 * 60);
  const { fleetNumber, hin, registration, enteredServiceOn, outings } = demo;
  const ctx = { db, actor: crew.manager, now: added };
  const unit = await createUnit(ctx, {
    ...{ fleetNumber, hin, registration, enteredServiceOn, outings },
    modelId: house.models[demo.model]!.id,
    dockId: dock.id,
    engineHours: demo.engineHoursTenths / 10,
  });
  await recordPast({ ...ctx, actor: crew.mechanic }, house, demo, unit.id);
  const book: Book = {
    ...{ db, crew, fleetNumber, outings },
    unitId: unit.id,
    timeZone: dock.timeZone,
    rules: house.rules,
    chance: chanceOf(`history ${fleetNumber}`),
    end: now,
    engineHoursTenths: demo.engineHoursTenths,
    baseTenths: 0,
    points: [],
    work: [],
    lastAt: added,
    lastReadAt: added,
  };
  await assess(book, new Date(added.getTime() + 60_000));
  const lastDay = localDay(now, dock.timeZone);
  const plan = planOutings(
    demo,
    demo.addedOn,
    lastDay,
    ({ on, fromMinute, minutes }) => instantOf(dock.timeZone, on, fromMinute + minutes) <= now,
  );
  const endRule = demo.ending ? house.byKey[demo.ending.rule] : null;
  await writeHistory(book, { unit: demo, plan, endRule, gearRule: house.byKey.safetyGear, lastDay });
  return book;
}

/** When each duty was last done, for a unit that came with a past; of a new one, its safety gear alone. */
async function recordPast(ctx: Context, house: House, demo: DemoUnit, unitId: string): Promise<void> {
  const { propulsion, stroke, carbCount } = house.models[demo.model]!;
  const scoped = {
    modelId: house.models[demo.model]!.id,
    dockId: house.docks[demo.dock]!.id,
    propulsion,
    stroke,
    carbCount,
  };
  const used = demo.engineHoursTenths > 0;
  for (const key of RULE_KEYS) {
    const rule = house.byKey[key];
    if (!ruleApplies(rule.appliesTo, scoped) || !(used || key === 'safetyGear')) continue;
    const chance = chanceOf(`past ${demo.fleetNumber} ${key}`);
    const interval = (on: 'engine_hours' | 'outings') =>
      rule.triggers.flatMap((trigger) => (trigger.on === on ? [trigger.every] : []))[0] ?? 40;
    const part = used ? chance.between(0.05, 0.75) : 0;
    await recordBaseline(ctx, unitId, {
      ruleId: rule.id,
      closedOn: key === 'safetyGear' ? demo.gearSeenOn : addDays(demo.addedOn, -Math.round(part * 160)),
      engineHours:
        Math.max(0, demo.engineHoursTenths - Math.round(part * interval('engine_hours') * 10)) / 10,
      outings: Math.max(0, demo.outings - Math.round(part * interval('outings'))),
      note: used ? 'From the paper log of the years before.' : 'Came new with the unit.',
    });
  }
}

/** Runs `work` over all items, some at a time. */
async function inTurn<T>(items: readonly T[], work: (item: T) => Promise<void>): Promise<void> {
  const waiting = [...items];
  const hand = async () => {
    for (let item = waiting.shift(); item !== undefined; item = waiting.shift()) await work(item);
  };
  await Promise.all(Array.from({ length: AT_ONCE }, hand));
}

/** Brings every due point up to now, after which the queued refreshes have nothing left to do, and takes them off. */
async function settle(db: Kysely<DB>, books: readonly Book[], now: Date): Promise<void> {
  const unitIds = books.map(({ unitId }) => unitId);
  await refreshDue({ db, actor: SYSTEM, now }, { unitIds });
  await sql`
    select graphile_worker.complete_jobs(array_agg(id)) from graphile_worker.jobs
     where task_identifier = 'refresh-due'`.execute(db);
  await sql`analyze`.execute(db);
}
