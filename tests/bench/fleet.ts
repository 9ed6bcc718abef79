import { sql, type Kysely } from 'kysely';
import type { DB } from '@/db/tables';
import type { Lead, Trigger, Window } from '@/lib/domain/rule';

/** How many units, and how many outings with a reading each unit has. */
export type FleetSize = { units: number; outingsEach: number };
const WHOLE: FleetSize = { units: 2_000, outingsEach: 500 };
/** Tenths of an engine hour an outing takes: an hour. */
const TENTHS_PER_OUTING = 10;
/** The last reading of every unit is this old, so that check-ins have past instants of their own to go to. */
const QUIET_DAYS = 60;

const hours = (every: number, anchor: Trigger['anchor'] = 'scheduled'): Trigger => ({
  on: 'engine_hours',
  every: every * 10,
  anchor,
});
const outings = (every: number): Trigger => ({ on: 'outings', every, anchor: 'scheduled' });
const calendar = (rrule: string, anchor: Trigger['anchor'] = 'scheduled'): Trigger => ({
  on: 'calendar',
  rrule,
  start: '2024-04-01',
  anchor,
});

/** Every kind of trigger, alone and together; `days` is how long an interval takes a unit that goes out as these do. */
const RULES: { name: string; days: number; triggers: Trigger[] }[] = [
  { name: 'Hull and steering', days: 91, triggers: [hours(25)] },
  { name: 'Oil and filter', days: 122, triggers: [hours(50)] },
  { name: 'Spark plugs', days: 135, triggers: [hours(60, 'completed')] },
  { name: 'Carburettor rebuild', days: 185, triggers: [hours(100)] },
  { name: 'Wear ring', days: 110, triggers: [outings(40)] },
  { name: 'Impeller', days: 210, triggers: [outings(120)] },
  { name: 'Extinguisher', days: 30, triggers: [calendar('FREQ=MONTHLY')] },
  { name: 'Lanyard and jackets', days: 28, triggers: [calendar('FREQ=WEEKLY;INTERVAL=4;BYDAY=MO')] },
  { name: 'Season opening', days: 365, triggers: [calendar('FREQ=YEARLY;BYMONTH=4;BYDAY=1MO')] },
  { name: 'Battery', days: 90, triggers: [calendar('FREQ=DAILY;INTERVAL=90', 'completed')] },
  { name: 'Fuel system', days: 160, triggers: [hours(80), calendar('FREQ=MONTHLY;INTERVAL=6')] },
  {
    name: 'Drive shaft',
    days: 247,
    triggers: [hours(150), outings(150), calendar('FREQ=YEARLY', 'completed')],
  },
];

const LEAD: Lead = { tenths: 10, outings: 2, days: 3 };
const WINDOW: Window = {
  earlyTenths: 50,
  lateTenths: 50,
  earlyOutings: 10,
  lateOutings: 5,
  earlyDays: 14,
  lateDays: 14,
};

/**
 * 2,000 units at three docks under 12 rules, a million outings each with its reading, and each rule done twice on
 * each unit: by set-based SQL, the same every time. Due points are not computed yet.
 */
export async function fillFleet(pool: Kysely<DB>, now: Date, size: FleetSize = WHOLE): Promise<void> {
  await pool.connection().execute(async (db) => {
    // Rows made from each other need no check of their references, which would take minutes.
    await sql`set session_replication_role = replica`.execute(db);
    await fill(db, now, size);
    await sql`reset session_replication_role`.execute(db);
  });
  await sql`vacuum analyze`.execute(pool);
}

async function fill(db: Kysely<DB>, now: Date, size: FleetSize): Promise<void> {
  const last = new Date(now.getTime() - QUIET_DAYS * 86_400_000);
  await sql`insert into operator (name) values ('Bench')`.execute(db);
  await sql`insert into dock (name, time_zone) values
    ('North', 'Europe/Lisbon'), ('South', 'America/New_York'), ('East', 'Europe/Lisbon')`.execute(db);
  await sql`insert into model (name, propulsion, stroke, engines, cylinders, carb_count)
    select 'Model ' || n, 'jet', case when n % 2 = 0 then 'two' else 'four' end, 1, n, n % 5
      from generate_series(1, 5) n`.execute(db);
  await sql`insert into person (email, name, role) values ('dock@bench.example', 'Dock', 'dock'),
    ('manager@bench.example', 'Manager', 'manager')`.execute(db);
  await addUnits(db, last, size);
  await addHistory(db, last, size);
  await addRules(db);
  await addClosings(db, last, size);
}

async function addUnits(db: Kysely<DB>, last: Date, size: FleetSize): Promise<void> {
  await sql`
    with docks as (select id, row_number() over (order by name) - 1 as place from dock),
    models as (select id, row_number() over (order by name) - 1 as place from model)
    insert into unit (fleet_number, model_id, dock_id, entered_service_on)
    select 'B-' || lpad(n::text, 4, '0'), m.id, d.id, '2024-03-15'
      from generate_series(1, ${size.units}::int) n
      join docks d on d.place = n % 3 join models m on m.place = n % 5`.execute(db);
  const ran = size.outingsEach * TENTHS_PER_OUTING;
  await sql`insert into live_meter (unit_id, read_at, base_tenths, shown_tenths, engine_hours_tenths, outing_count)
    select id, ${last}, 0, ${ran}, ${ran}, ${size.outingsEach} from unit`.execute(db);
  await sql`insert into assessment (unit_id) select id from unit`.execute(db);
}

/** An outing every 30 hours up to the last, each ended by a reading of an hour more. */
async function addHistory(db: Kysely<DB>, last: Date, size: FleetSize): Promise<void> {
  await sql`insert into outing (id, unit_id, dock_id, started_at, ended_at)
    select gen_random_uuid(), u.id, u.dock_id, t - interval '65 minutes', t
      from generate_series(1, ${size.outingsEach}::int) n
      cross join unit u
      cross join lateral (select ${last}::timestamptz - (${size.outingsEach}::int - n) * interval '30 hours' as t) i`.execute(
    db,
  );
  await sql`insert into reading (unit_id, taken_at, shown_tenths, base_tenths, source, outing_id, recorded_at)
    select unit_id, ended_at, ${TENTHS_PER_OUTING}::int * row_number() over (partition by unit_id order by ended_at),
           0, 'check_in', id, ended_at
      from outing order by ended_at`.execute(db);
  await sql`update live_meter m set reading_id = r.id from reading r
    where r.unit_id = m.unit_id and r.taken_at = m.read_at`.execute(db);
}

async function addRules(db: Kysely<DB>): Promise<void> {
  for (const { name, triggers } of RULES)
    await db
      .insertInto('rule')
      .values({
        name,
        kind: 'service',
        scope: '{}',
        triggers: JSON.stringify(triggers),
        lead: JSON.stringify(LEAD),
        tolerance: JSON.stringify(WINDOW),
        holds_unit: true,
        labour: JSON.stringify({ baseMinutes: 30, perCarbMinutes: 15, perEngineMinutes: 10 }),
      })
      .execute();
}

/** Done one and two intervals ago, spread so that a few duties in a hundred are overdue now. */
async function addClosings(db: Kysely<DB>, last: Date, size: FleetSize): Promise<void> {
  const spread = JSON.stringify(Object.fromEntries(RULES.map(({ name, days }) => [name, days])));
  await sql`
    with done as (
      select gen_random_uuid() as task_id, u.id as unit_id, r.id as rule_id, r.name, r.kind,
             now() - (((hashtext(u.fleet_number || r.name) & 1023) / 960.0 + k) * (d.days::text)::int) * interval '1 day' as at
        from unit u cross join rule r
        join jsonb_each(${spread}::jsonb) d(name, days) on d.name = r.name
        cross join generate_series(0, 1) k
    ), tasks as (
      insert into task (id, unit_id, kind, title, origin, rule_id, opened_at, started_at, ended_at)
      select task_id, unit_id, kind, name, 'rule', rule_id, at - interval '1 day', at, at from done
    )
    insert into closure (task_id, unit_id, rule_id, closed_at, closed_on, engine_hours_tenths, outings, minutes)
    select task_id, unit_id, rule_id, at, at::date,
           ${size.outingsEach * TENTHS_PER_OUTING}::int - ran * ${TENTHS_PER_OUTING}::int,
           ${size.outingsEach}::int - ran, 45
      from done
      cross join lateral (
        select least(${size.outingsEach}::int, greatest(0,
          ceil(extract(epoch from ${last}::timestamptz - at) / 108000)))::int as ran) o`.execute(db);
}
