import { randomUUID } from 'node:crypto';
import { Kysely, PostgresDialect, sql, type CompiledQuery, type LogEvent } from 'kysely';
import pg from 'pg';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { DB } from '@/db/tables';
import { checkIn } from '@/lib/actions/check-in';
import { checkOut } from '@/lib/actions/check-out';
import { getAvailability } from '@/lib/actions/get-availability';
import { findActor } from '@/lib/auth/actor';
import { testApi, type Caller } from '../support/http';
import { asSystem, openDock } from '../support/crew';
import { testDatabase } from '../support/database';

const database = testDatabase({ keep: true });
const api = testApi(database);
let counting: Kysely<DB>;
let statements: CompiledQuery[] = [];
let unitId: string;
let hand: Caller;

beforeAll(async () => {
  hand = await api.caller('dock');
  ({
    unit: { id: unitId },
  } = await openDock(database.db, { holdsAt: 500 }));
  const pool = new pg.Pool({ connectionString: database.url, max: 1 });
  counting = new Kysely<DB>({
    dialect: new PostgresDialect({ pool }),
    log: (event: LogEvent) => void statements.push(event.query),
  });
  await addHistory();
});
afterAll(() => counting.destroy());

/** 200,000 readings and outings of 200 other units, by SQL. */
async function addHistory(): Promise<void> {
  await sql`
    with others as (
      insert into unit (fleet_number, model_id, dock_id, entered_service_on)
      select 'H-' || n, u.model_id, u.dock_id, '2024-01-01' from unit u, generate_series(1, 200) n
       where u.id = ${unitId} returning id
    ), meters as (
      insert into live_meter (unit_id, read_at, base_tenths, shown_tenths, engine_hours_tenths, outing_count)
      select id, '2026-05-01', 0, 6000, 6000, 1000 from others returning unit_id
    ), assessed as (
      insert into assessment (unit_id, assessed_revision) select unit_id, 1 from meters
    ), points as (
      insert into due_point (unit_id, rule_id, trigger_index, due_tenths, upcoming_from_tenths, overdue_from_tenths)
      select unit_id, r.id, 0, 5000, 5000, 5000 from meters, rule r
    ), outings as (
      insert into outing (id, unit_id, dock_id, started_at, ended_at)
      select gen_random_uuid(), unit_id, u.dock_id, t - interval '50 minutes', t
        from meters, unit u, generate_series(1, 1000) n, lateral (select timestamptz '2024-01-01' + n * interval '20 hours' as t) i
       where u.id = ${unitId}
    )
    insert into reading (unit_id, taken_at, shown_tenths, base_tenths, source)
    select unit_id, timestamptz '2024-01-01' + n * interval '20 hours', n * 6, 0, 'check_in'
      from meters, generate_series(1, 1000) n`.execute(counting);
  for (const table of ['reading', 'outing', 'unit', 'live_meter', 'due_point', 'assessment'])
    await sql`analyze ${sql.table(table)}`.execute(database.db);
}

/** What `work` asks of the database, statement by statement. */
async function statementsOf(work: () => Promise<unknown>): Promise<CompiledQuery[]> {
  statements = [];
  await work();
  return statements;
}

const at = (time: string) => ({ ...asSystem(counting, `2026-06-02T${time}:00Z`) });

describe('what a check-in costs', () => {
  test('is three round trips with the look-up of who sends it, and one commit', async () => {
    const headers = new Headers({ authorization: `Bearer ${hand.key}` });
    const asked = await statementsOf(async () => {
      const actor = await findActor(counting, headers);
      await checkIn(
        { ...at('11:00'), actor: actor! },
        { id: randomUUID(), unitId, hours: 100.5, defect: { title: 'Seat torn', holdsUnit: false } },
      );
    });
    // No begin and commit among them: each statement is a transaction of its own. The look-up of a key may note,
    // once a minute, that it was used; a session's writes nothing.
    expect(asked).toHaveLength(3);
    expect(asked.slice(1).map(({ sql: text }) => /^\s*(\w+)/.exec(text)?.[1])).toEqual(['select', 'with']);
    expect(asked[1]!.sql).not.toMatch(/\b(insert|update|delete)\b/);
  });

  test('writes everything in one transaction, the job too', async () => {
    const id = randomUUID();
    await checkIn(at('12:00'), { id, unitId, hours: 101 });
    const { rows } = await sql<{ what: string; xmin: string }>`
      select 'reading' as what, xmin::text from reading where id = ${id}
      union all select 'outing', o.xmin::text from outing o join reading r on r.outing_id = o.id where r.id = ${id}
      union all select 'meter', xmin::text from live_meter where unit_id = ${unitId}
      union all select 'job', j.xmin::text from graphile_worker._private_jobs j
        where j.payload::text like ${`%${unitId}%`}
          and j.xmin = (select xmin from reading where id = ${id})`.execute(database.db);
    expect(rows.map(({ what }) => what).sort()).toEqual(['job', 'meter', 'outing', 'reading']);
    expect(new Set(rows.map(({ xmin }) => xmin)).size).toBe(1);
  });
});

test('availability is read in one statement, two when a dock is named', async () => {
  expect(await statementsOf(() => getAvailability(at('12:00'), {}))).toHaveLength(1);
  const { dock_id: dockId } = await database.db
    .selectFrom('unit')
    .select('dock_id')
    .limit(1)
    .executeTakeFirstOrThrow();
  expect(await statementsOf(() => getAvailability(at('12:00'), { dockId }))).toHaveLength(2);
});

describe('no statement reads through a whole large table', () => {
  test.each([
    ['a check-in', () => checkIn(at('13:00'), { id: randomUUID(), unitId, hours: 101.5 })],
    [
      'a check-in that ends an outing',
      async () => {
        await checkOut(at('13:30'), { id: randomUUID(), unitId });
        await checkIn(at('14:00'), { id: randomUUID(), unitId, hours: 101.8 });
      },
    ],
    [
      'a check-in sent again',
      async () => {
        const entry = { id: randomUUID(), unitId, hours: 102 };
        await checkIn(at('15:00'), entry);
        await checkIn(at('15:01'), entry);
      },
    ],
    ['availability with 200 units overdue', () => getAvailability(at('15:00'), { hours: 2 })],
  ])('%s', async (_, work) => {
    const asked = (await statementsOf(work)).filter(({ sql: text }) =>
      /^\s*(select|with|update|insert)/.test(text),
    );
    expect(asked.length).toBeGreaterThan(0);
    const scanned: string[] = [];
    for (const { sql: text, parameters } of asked) {
      const plan = await explain(text, parameters);
      scanned.push(...plan.filter((line) => /Seq Scan on (reading|outing)\b/.test(line)));
    }
    expect(scanned).toEqual([]);
  });
});

async function explain(text: string, parameters: readonly unknown[]): Promise<string[]> {
  const client = new pg.Client({ connectionString: database.url });
  await client.connect();
  try {
    const { rows } = await client.query<{ 'QUERY PLAN': string }>(`explain ${text}`, [...parameters]);
    return rows.map((row) => row['QUERY PLAN']);
  } finally {
    await client.end();
  }
}
