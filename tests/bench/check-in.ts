import { randomUUID } from 'node:crypto';
import autocannon from 'autocannon';
import { sql } from 'kysely';
import { atLeast, median, type Figure } from './figures';
import type { Setting } from './setting';

const ROUNDS = 5;
const SECONDS = 2;
const CONNECTIONS = 10;
const COUNTED = 200;

/** Bodies of check-ins that are all valid and all different: each unit in turn, an hour on and 0.3 h more each time. */
export async function checkInBodies({ db }: Setting): Promise<() => string> {
  const meters = await db.selectFrom('live_meter').select(['unit_id', 'shown_tenths', 'read_at']).execute();
  let next = 0;
  return () => {
    const meter = meters[next++ % meters.length]!;
    meter.shown_tenths += 3;
    meter.read_at = new Date(meter.read_at.getTime() + 3_600_000);
    return JSON.stringify({
      id: randomUUID(),
      unitId: meter.unit_id,
      hours: meter.shown_tenths / 10,
      at: meter.read_at.toISOString(),
    });
  };
}

/** Requests a second of whole check-ins over HTTP, against those of an empty route of the same server. */
export async function measureCheckIn(setting: Setting): Promise<Figure[]> {
  const { app, cookie, idle } = setting;
  const body = await checkInBodies(setting);
  const counted = await countStatements(setting, body);
  const empty = () => fire(app.baseUrl, [{ path: '/api/v1/health' }]);
  const checkIns = () =>
    fire(app.baseUrl, [
      {
        method: 'POST',
        path: '/api/v1/check-ins',
        headers: { cookie: cookie.dock, 'content-type': 'application/json', origin: app.baseUrl },
        setupRequest: (request) => ({ ...request, body: body() }),
      },
    ]);
  await empty();
  await checkIns();
  const rounds: { empty: number; checkIns: number }[] = [];
  for (let round = 0; round < ROUNDS; round += 1) {
    await idle();
    const one = { empty: await empty(), checkIns: await checkIns() };
    rounds.push(one);
  }
  await idle();
  const [emptyRate, rate] = [median(rounds.map((r) => r.empty)), median(rounds.map((r) => r.checkIns))];
  return [
    atLeast(
      'check-in over HTTP, requests a second against an empty route',
      median(rounds.map((r) => r.checkIns / r.empty)),
      0.75,
      `${Math.round(rate)} of ${Math.round(emptyRate)} a second`,
    ),
    ...counted,
  ];
}

async function fire(url: string, requests: Parameters<typeof autocannon>[0]['requests']): Promise<number> {
  const result = await autocannon({ url, connections: CONNECTIONS, duration: SECONDS, requests });
  const failed = result.non2xx + result.errors + result.timeouts;
  if (failed > 0) throw new Error(`${failed} requests failed of ${result.requests.total}`);
  return result.requests.total / result.duration;
}

/** Round trips by pg_stat_statements and transactions that wrote, with the worker stopped so that only the web writes. */
async function countStatements({ app, cookie, db }: Setting, body: () => string): Promise<Figure[]> {
  await app.worker.stop();
  const written = async () => {
    const { rows } = await sql<{ id: string }>`select pg_current_xact_id()::text as id`.execute(db);
    return Number(rows[0]!.id);
  };
  const before = await written();
  await sql`select pg_stat_statements_reset()`.execute(db);
  for (let sent = 0; sent < COUNTED; sent += 1) {
    const answer = await fetch(`${app.baseUrl}/api/v1/check-ins`, {
      method: 'POST',
      headers: { cookie: cookie.dock, 'content-type': 'application/json', origin: app.baseUrl },
      body: body(),
    });
    if (answer.status !== 201) throw new Error(`a check-in was refused: ${await answer.text()}`);
    await answer.arrayBuffer();
  }
  const { rows } = await sql<{ calls: number }>`
    select sum(calls)::int as calls from pg_stat_statements
     where toplevel and query not like '%pg_stat_statements%'`.execute(db);
  const commits = ((await written()) - before - 1) / COUNTED;
  app.worker.start();
  const calls = rows[0]!.calls / COUNTED;
  return [
    { what: 'SQL round trips of a check-in', measured: String(calls), target: '≤ 3', reached: calls <= 3 },
    { what: 'commits of a check-in', measured: String(commits), target: '≤ 1', reached: commits <= 1 },
  ];
}
