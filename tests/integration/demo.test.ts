import { sql, type Kysely } from 'kysely';
import { afterAll, beforeAll, describe, expect, inject, test } from 'vitest';
import { seedDemo } from '@/db/seed/demo';
import type { DB } from '@/db/tables';
import { getAvailability } from '@/lib/actions/get-availability';
import { signIn } from '@/lib/actions/sign-in';
import { SYSTEM } from '@/lib/domain/access';
import type { Availability } from '@/lib/schemas/availability';
import { cloneDatabase, type TestDatabase } from '../support/clone';

/** A Sunday afternoon at the end of winter, on which the clocks of both time zones go forward. */
const NOW = new Date('2026-03-08T17:30:00Z');

let [first, second]: TestDatabase[] = [];
let shown: Availability;
const said: string[] = [];

beforeAll(async () => {
  const url = inject('serverUrl');
  [first, second] = [await cloneDatabase(url), await cloneDatabase(url)];
  await Promise.all([
    seedDemo(first.db, { now: NOW, progress: (line) => said.push(line) }),
    seedDemo(second.db, { now: NOW, progress: () => undefined }),
  ]);
  shown = await getAvailability({ db: first.db, actor: SYSTEM, now: NOW }, {});
}, 900_000);
afterAll(async () => {
  await first?.destroy();
  await second?.destroy();
});

async function ask<T>(text: string, { db }: { db: Kysely<DB> } = first!): Promise<T[]> {
  return (await sql.raw<T>(text).execute(db)).rows;
}

/** Every fact by what people know it by, not by ids that chance gave. */
const FACTS = {
  readings: `select u.fleet_number, r.taken_at, r.shown_tenths, r.base_tenths, r.source, r.review_code, r.void_reason,
      p.email from reading r join unit u on u.id = r.unit_id left join person p on p.id = r.recorded_by
     order by 1, 2, 3, 5`,
  outings: `select u.fleet_number, o.started_at, o.due_back_at, o.ended_at, o.renter_reference
      from outing o join unit u on u.id = o.unit_id order by 1, 4, 2`,
  closures: `select u.fleet_number, r.name, c.closed_at, c.engine_hours_tenths, c.outings, c.minutes, c.note
      from closure c join unit u on u.id = c.unit_id left join rule r on r.id = c.rule_id order by 1, 3, 2`,
  baselines: `select u.fleet_number, r.name, b.closed_on, b.engine_hours_tenths, b.outings
      from baseline b join unit u on u.id = b.unit_id join rule r on r.id = b.rule_id order by 1, 2`,
  tasks: `select u.fleet_number, t.title, t.opened_at, t.planned_on, t.started_at, t.ended_at
      from task t join unit u on u.id = t.unit_id order by 1, 3, 2`,
  defects: `select u.fleet_number, d.title, d.reported_at, d.cleared_at from defect d join unit u on u.id = d.unit_id
     order by 1, 3, 2`,
  stockMoves: `select p.number, d.name, m.kind, m.quantity, m.reason, m.moved_at from stock_move m
      join part p on p.id = m.part_id join dock d on d.id = m.dock_id order by 1, 2, m.seq`,
  duePoints: `select u.fleet_number, r.name, p.trigger_index, p.due_tenths, p.due_outings, p.due_on
      from due_point p join unit u on u.id = p.unit_id join rule r on r.id = p.rule_id order by 1, 2, 3`,
};

describe('the demo', () => {
  test.each(Object.entries(FACTS))(
    'has the same %s each time it is loaded for one moment',
    async (_, text) => {
      const rows = await ask(text);
      expect(rows.length).toBeGreaterThan(20);
      expect(await ask(text, second!)).toEqual(rows);
    },
  );

  test('has three docks in two time zones, and 40 or more units of at least five models', async () => {
    const [counts] =
      await ask(`select count(distinct d.id)::int as docks, count(distinct d.time_zone)::int as zones,
        count(distinct u.model_id)::int as models, count(distinct u.id)::int as units
      from unit u join dock d on d.id = u.dock_id`);
    expect(counts).toMatchObject({ docks: 3, zones: 2 });
    expect(counts).toEqual(expect.objectContaining({ models: 6, units: 46 }));
  });

  test('has craft of no, one, two, three and four carburettors, two- and four-stroke', async () => {
    expect(
      await ask(
        `select distinct m.carb_count as carbs from model m join unit u on u.model_id = m.id order by 1`,
      ),
    ).toEqual([0, 1, 2, 3, 4].map((carbs) => ({ carbs })));
    expect(await ask(`select distinct stroke from model order by 1`)).toEqual([
      { stroke: 'four' },
      { stroke: 'two' },
      { stroke: null },
    ]);
  });

  // Written from the regulations' own words (33 CFR 181.25 and 174.23), apart from the code that checks input.
  test('gives every craft a hull number and a registration as the regulations have them', async () => {
    const craft = await ask<{ hin: string; registration: string }>(`select hin, registration from unit`);
    for (const { hin, registration } of craft) {
      expect(hin).toMatch(/^[A-Z0-9]{3}[A-HJ-NPR-Z0-9]{5}[A-L][0-9][0-9]{2}$/);
      expect(registration).toMatch(/^[A-Z]{2} ([0-9]{1,4} [A-HJ-NPR-Z]{1,2}|[0-9]{1,3} [A-HJ-NPR-Z]{1,3})$/);
    }
    expect(new Set(craft.map(({ hin }) => hin)).size).toBe(craft.length);
    expect(new Set(craft.map(({ registration }) => registration)).size).toBe(craft.length);
  });

  test('has two years of outings, busier at weekends and in summer', async () => {
    const [counts] = await ask<Record<string, number>>(`select count(*)::int as all,
        (max(ended_at)::date - min(ended_at)::date) as days,
        (count(*) filter (where extract(isodow from ended_at) >= 6) / 2.0)::float as weekend,
        (count(*) filter (where extract(isodow from ended_at) < 6) / 5.0)::float as weekday,
        count(*) filter (where extract(month from ended_at) = 7)::int as july,
        count(*) filter (where extract(month from ended_at) = 12)::int as december
      from outing where ended_at is not null`);
    expect(counts!.all).toBeGreaterThan(8_000);
    expect(counts!.all).toBeLessThan(12_500);
    expect(counts!.days).toBeGreaterThanOrEqual(727);
    expect(counts!.weekend! / counts!.weekday!).toBeGreaterThan(1.5);
    expect(counts!.july! / counts!.december!).toBeGreaterThan(2);
  });

  test('shows units ready, out, late and held: overdue by hours, by outings and by date, defective, laid up', () => {
    expect(shown.ready.length).toBeGreaterThan(20);
    expect(shown.out.length).toBeGreaterThanOrEqual(3);
    expect(shown.out.some(({ dueBackAt }) => dueBackAt! < NOW.toISOString())).toBe(true);
    const holds = shown.held.flatMap((unit) => unit.holds);
    const reasons = holds.map(({ reason }) => reason);
    expect(reasons.filter((reason) => reason === 'overdue').length).toBeGreaterThanOrEqual(4);
    expect(reasons.filter((reason) => reason === 'defect').length).toBeGreaterThanOrEqual(2);
    expect(reasons.filter((reason) => reason === 'laid_up').length).toBe(2);
    expect(reasons).not.toContain('not_assessed');
    const overdue = holds.filter(({ reason }) => reason === 'overdue').map(({ text }) => text);
    expect(overdue.some((text) => text.startsWith('Carburettor rebuild'))).toBe(true);
    expect(overdue.some((text) => text.startsWith('Cut-off lanyard'))).toBe(true);
    expect(overdue.some((text) => text.startsWith('Fire extinguisher'))).toBe(true);
  });

  test('has work open, planned, begun and noted, and readings voided, swapped and waiting for the manager', async () => {
    const [work] =
      await ask(`select count(*) > 15 as open, count(planned_on) > 5 as planned, count(started_at) > 1 as begun,
        bool_and(planned_on is null or planned_on between '2026-03-08' and '2026-03-22') as soon,
        (select count(*) > 2 from task_note) as noted, (select count(note) > 50 from closure) as remarked
      from task where ended_at is null`);
    expect(work).toEqual({ open: true, planned: true, begun: true, soon: true, noted: true, remarked: true });
    const [readings] = await ask(`select count(*) filter (where voided_at is not null)::int as void,
        count(*) filter (where source = 'swap_first')::int as swaps,
        count(*) filter (where review_code = 'unusual_jump' and reviewed_at is null)::int as waiting,
        count(*) filter (where reviewed_at is not null)::int as reviewed
      from reading`);
    expect(readings).toEqual({ void: 1, swaps: 1, waiting: 1, reviewed: 1 });
  });

  test('has units in every state, and every meter read within the last days', async () => {
    const [states] = await ask(`select
        count(*) filter (where m.engine_hours_tenths >= p.due_tenths or m.outing_count >= p.due_outings
          or p.due_on <= '2026-03-08') > 5 as due,
        count(*) filter (where m.engine_hours_tenths between p.upcoming_from_tenths and p.due_tenths - 1
          or m.outing_count between p.upcoming_from_outings and p.due_outings - 1
          or '2026-03-08' between p.upcoming_from_on and p.due_on - 1) > 5 as upcoming
      from due_point p join live_meter m using (unit_id)`);
    expect(states).toEqual({ due: true, upcoming: true });
    const [oldest] = await ask<{ at: Date }>(`select min(read_at) as at from live_meter`);
    expect(NOW.getTime() - oldest!.at.getTime()).toBeLessThan(10 * 86_400_000);
  });

  test('leaves nothing of the future behind, and no work for the worker', async () => {
    const [after] =
      await ask(`select (select count(*)::int from reading where taken_at > '${NOW.toISOString()}') as readings,
        (select count(*)::int from closure where closed_at > '${NOW.toISOString()}') as closures,
        (select count(*)::int from graphile_worker.jobs) as jobs,
        (select count(*)::int from assessment where assessed_revision < wanted_revision) as behind`);
    expect(after).toEqual({ readings: 0, closures: 0, jobs: 0, behind: 0 });
    expect(said.length).toBeGreaterThan(4);
  });

  test.each(['manager', 'mechanic', 'dock'])('lets its %s sign in', async (who) => {
    const ctx = { db: first!.db, actor: SYSTEM, now: NOW };
    const email = `${who}@wakewright.example`;
    const input = { email, password: 'three-docks-afloat', address: '127.0.0.1', deviceToken: null };
    expect((await signIn(ctx, input)).expiresAt > NOW).toBe(true);
  });
});
