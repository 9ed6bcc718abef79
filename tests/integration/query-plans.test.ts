import { randomUUID } from 'node:crypto';
import { Kysely, PostgresDialect, sql, type CompiledQuery } from 'kysely';
import pg from 'pg';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { DB } from '@/db/tables';
import { checkIn } from '@/lib/actions/check-in';
import { checkOut } from '@/lib/actions/check-out';
import { getAvailability } from '@/lib/actions/get-availability';
import { getCalendar } from '@/lib/actions/get-calendar';
import { listHistory } from '@/lib/actions/list-history';
import { openTasks } from '@/lib/actions/open-tasks';
import { correctDuePoints } from '@/lib/actions/correct-due-points';
import { refreshDue } from '@/lib/actions/refresh-due';
import { refreshFleet } from '@/lib/actions/refresh-fleet';
import { sessionCookieName } from '@/lib/auth/cookies';
import { signSessionToken } from '@/lib/auth/session-token';
import { findActor } from '@/lib/auth/actor';
import type { Context } from '@/lib/context';
import { env } from '@/lib/env';
import { fillFleet } from '../bench/fleet';
import { testDatabase } from '../support/database';
import { setEnvironment } from '../support/worker';

const database = testDatabase({ keep: true });
const now = new Date('2026-07-01T12:00:00Z');
let listening: Kysely<DB>;
let statements: CompiledQuery[] = [];
let unitId: string;
let sessionId: string;

/** 300 units with 60,000 outings and readings, 7,200 closures and 5,000 sessions, all due points computed. */
beforeAll(async () => {
  setEnvironment(database.url);
  const pool = new pg.Pool({ connectionString: database.url, max: 1 });
  listening = new Kysely<DB>({
    dialect: new PostgresDialect({ pool }),
    log: ({ query }) => void statements.push(query),
  });
  await fillFleet(database.db, now, { units: 300, outingsEach: 200 });
  await refreshFleet(ctx());
  await sql`insert into session (person_id, session_version, expires_at)
    select id, 1, ${new Date(now.getTime() + 86_400_000)} from person, generate_series(1, 2500)`.execute(
    database.db,
  );
  await sql`vacuum analyze`.execute(database.db);
  const unit = await database.db.selectFrom('unit').select('id').limit(1).executeTakeFirstOrThrow();
  const session = await database.db.selectFrom('session').select('id').limit(1).executeTakeFirstOrThrow();
  [unitId, sessionId] = [unit.id, session.id];
});
afterAll(() => listening.destroy());

function ctx(): Context {
  return { db: listening, actor: { kind: 'system' }, now };
}

/** The lines of the plans of all that `work` asks that read through one of these tables. */
async function scansOf(work: () => Promise<unknown>, tables: readonly string[]): Promise<string[]> {
  statements = [];
  await work();
  const asked = statements.filter(({ sql: text }) => /^\s*(select|with|update|insert|delete)/.test(text));
  expect(asked.length).toBeGreaterThan(0);
  const scan = new RegExp(`Seq Scan on (${tables.join('|')})\\b`);
  const found: string[] = [];
  for (const { sql: text, parameters } of asked) {
    const plan = await explain(text, parameters);
    found.push(...plan.filter((line) => scan.test(line)));
  }
  return found;
}

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

const HISTORY = ['reading', 'outing', 'session'];

describe('of one unit or one session, no large table is read through', () => {
  test.each<[string, () => Promise<unknown>]>([
    [
      'by who sends a request',
      () => {
        const expiresAtSeconds = Math.floor(now.getTime() / 1000) + 3600;
        const token = signSessionToken({ sessionId, expiresAtSeconds }, env().AUTH_SECRET);
        return findActor(listening, new Headers({ cookie: `${sessionCookieName()}=${token}` }), now);
      },
    ],
    [
      'by a check-out',
      () => checkOut(ctx(), { id: randomUUID(), unitId, at: new Date('2026-07-01T10:00:00Z') }),
    ],
    ['by a check-in', () => checkIn(ctx(), { id: randomUUID(), unitId, hours: 200.5 })],
    ['by the refresh of a unit', () => refreshDue(ctx(), { unitIds: [unitId] })],
    [
      'by the refresh of a unit whose due points are wrong',
      async () => {
        await sql`delete from due_point where unit_id = ${unitId}`.execute(database.db);
        expect(await correctDuePoints(ctx(), [unitId])).toBeGreaterThan(0);
      },
    ],
    ['by the history of a unit', () => listHistory(ctx(), unitId, {})],
  ])('%s', async (_, work) => {
    expect(await scansOf(work, [...HISTORY, 'closure', 'due_point'])).toEqual([]);
  });
});

describe('of the whole fleet, no reading, outing or session is read through', () => {
  test.each<[string, () => Promise<unknown>]>([
    ['by availability', () => getAvailability(ctx(), { hours: 2 })],
    ['by a calendar month', () => getCalendar(ctx(), { from: '2026-06-15', to: '2026-07-15' })],
    ['by the opening of tasks', () => openTasks(ctx(), 'all')],
    ['by the refresh of the fleet', () => refreshFleet(ctx(), { thorough: true })],
  ])('%s', async (_, work) => {
    expect(await scansOf(work, HISTORY)).toEqual([]);
  });
});
