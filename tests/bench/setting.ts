import { randomUUID } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { sql, type Kysely } from 'kysely';
import { createDatabase } from '@/db/client';
import { makeDatabase } from '@/db/databases';
import { migrateToLatest } from '@/db/migrate';
import type { DB } from '@/db/tables';
import { refreshFleet } from '@/lib/actions/refresh-fleet';
import { sessionCookieName } from '@/lib/auth/cookies';
import { signSessionToken } from '@/lib/auth/session-token';
import type { Context } from '@/lib/context';
import { startApp, type App } from '../support/app';
import { startThrowawayServer } from '../support/throwaway-server';
import { fillFleet } from './fleet';

/** What every measurement works on: a filled database, the production server and the worker on it. */
export interface Setting {
  db: Kysely<DB>;
  url: string;
  app: App;
  /** The `Cookie` header of somebody signed in at every dock. */
  cookie: { dock: string; manager: string };
  ctx(): Context;
  /** Settles when no job waits or runs. */
  idle(): Promise<void>;
  stop(): Promise<void>;
}

/** As the product's own PostgreSQL runs: nothing is traded against a power cut. Only the statistics are added. */
const SERVER_SETTINGS = {
  fsync: 'on',
  synchronous_commit: 'on',
  full_page_writes: 'on',
  shared_preload_libraries: 'pg_stat_statements',
};

/** Makes all of it. The caller stops it. */
export async function openSetting(say: (what: string) => void): Promise<Setting> {
  say('Starting a PostgreSQL of its own');
  const server = await startThrowawayServer(SERVER_SETTINGS);
  try {
    await makeDatabase(server.url('postgres'), 'bench');
    const url = server.url('bench');
    await migrateToLatest(url);
    await fillDatabase(url, say);
    say('Starting the production server and the worker');
    return await openApp(url, () => server.stop());
  } catch (error) {
    await server.stop();
    throw error;
  }
}

export async function fillDatabase(url: string, say: (what: string) => void): Promise<void> {
  const db = openBench(url);
  say('Filling it: 2,000 units, 12 rules, a million readings');
  await fillFleet(db, new Date());
  say('Computing due points');
  await refreshFleet({ db, actor: { kind: 'system' }, now: new Date() });
  await sql`create extension pg_stat_statements`.execute(db);
  await sql`vacuum analyze`.execute(db);
  await sql`checkpoint`.execute(db);
  await db.destroy();
}

export async function openApp(url: string, stopServer: () => Promise<void>): Promise<Setting> {
  const db = openBench(url);
  const app = await startApp({ databaseUrl: url });
  return {
    db,
    url,
    app,
    cookie: {
      dock: await openSession(db, app, 'dock@bench.example'),
      manager: await openSession(db, app, 'manager@bench.example'),
    },
    ctx: () => ({ db, actor: { kind: 'system' }, now: new Date() }),
    idle: () => untilIdle(db),
    stop: async () => {
      await app.stop();
      await db.destroy();
      await stopServer();
    },
  };
}

const openBench = (url: string) =>
  createDatabase({ url, max: 8, applicationName: 'bench', statementTimeoutMs: 0 });

async function openSession(db: Kysely<DB>, app: App, email: string): Promise<string> {
  const sessionId = randomUUID();
  const expiresAt = new Date(Date.now() + 86_400_000);
  await sql`insert into session (id, person_id, session_version, expires_at)
    select ${sessionId}::uuid, id, session_version, ${expiresAt}::timestamptz from person where email = ${email}`.execute(
    db,
  );
  const expiresAtSeconds = Math.floor(expiresAt.getTime() / 1000);
  const token = signSessionToken({ sessionId, expiresAtSeconds }, app.env.AUTH_SECRET);
  return `${sessionCookieName(app.env.PUBLIC_URL)}=${token}`;
}

async function untilIdle(db: Kysely<DB>): Promise<void> {
  for (;;) {
    const { rows } = await sql`select 1 from graphile_worker._private_jobs
      where attempts < max_attempts and run_at <= now() limit 1`.execute(db);
    if (rows.length === 0) return;
    await sql`select pg_sleep(0.05)`.execute(db);
  }
}

/** The most memory a process has had, in MB of 10⁶ bytes: VmHWM of proc(5). */
export function peakMemory(pid: number): number {
  const kib = /^VmHWM:\s+(\d+) kB$/m.exec(readFileSync(`/proc/${pid}/status`, 'utf8'))?.[1];
  return (Number(kib) * 1024) / 1e6;
}
