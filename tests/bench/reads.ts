import { CompiledQuery, Kysely, PostgresDialect } from 'kysely';
import { createPool } from '@/db/client';
import type { DB } from '@/db/tables';
import { getAvailability } from '@/lib/actions/get-availability';
import { getCalendar } from '@/lib/actions/get-calendar';
import type { Context } from '@/lib/context';
import { atMost, median, ms, timed, type Figure } from './figures';
import type { Setting } from './setting';

const ROUNDS = 7;
const FROM = new Date(Date.now() - 15 * 86_400_000).toISOString().slice(0, 10);
const TO = new Date(Date.now() + 15 * 86_400_000).toISOString().slice(0, 10);

/** Availability of the whole fleet and a month of the calendar over HTTP, against their SQL run by itself. */
export async function measureReads(setting: Setting): Promise<Figure[]> {
  await setting.idle();
  return [
    await measure(setting, 'availability of the whole fleet', '/api/v1/availability', (ctx) =>
      getAvailability(ctx, {}),
    ),
    await measure(setting, 'a calendar month', `/api/v1/calendar?from=${FROM}&to=${TO}`, (ctx) =>
      getCalendar(ctx, { from: FROM, to: TO }),
    ),
  ];
}

async function measure(
  { app, cookie, url }: Setting,
  what: string,
  path: string,
  action: (ctx: Context) => Promise<unknown>,
): Promise<Figure> {
  const pool = createPool({ url, max: 1 });
  const statements: CompiledQuery[] = [];
  const listening = new Kysely<DB>({
    dialect: new PostgresDialect({ pool }),
    log: ({ query }) => void statements.push(query),
  });
  await action({ db: listening, actor: { kind: 'system' }, now: new Date() });
  const bare = async () => {
    for (const { sql, parameters } of [...statements]) await pool.query(sql, [...parameters]);
  };
  const get = async (at: string) => {
    const answer = await fetch(app.baseUrl + at, {
      headers: { cookie: cookie.manager, 'accept-encoding': 'identity' },
    });
    if (answer.status !== 200) throw new Error(`${at}: ${answer.status}`);
    bytes = (await answer.arrayBuffer()).byteLength;
  };
  let bytes = 0;
  const rounds: { bare: number; empty: number; whole: number }[] = [];
  for (let round = -3; round < ROUNDS; round += 1) {
    const [bareMs, emptyMs] = [await timed(bare), await timed(() => get('/api/v1/health'))];
    const whole = await timed(() => get(path));
    if (round >= 0) rounds.push({ bare: bareMs, empty: emptyMs, whole });
  }
  await listening.destroy();
  return atMost(
    `${what} over HTTP, less the empty route, against its SQL`,
    median(rounds.map((r) => (r.whole - r.empty) / r.bare)),
    2,
    `${ms(median(rounds.map((r) => r.whole)))} to ${ms(median(rounds.map((r) => r.bare)))}, ${Math.round(bytes / 1000)} kB`,
  );
}
