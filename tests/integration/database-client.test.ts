import { sql } from 'kysely';
import { expect, test, vi } from 'vitest';
import { createPool } from '@/db/client';
import { migrationsCurrent } from '@/db/migrate';
import { runTransaction } from '@/db/transaction';
import { testDatabase } from '../support/database';

const database = testDatabase();

test('a day comes back as the day that was stored, whatever the time zone of the process', async () => {
  const { rows } = await sql<{ day: string; days: string[] }>`
    select date '2026-03-29' as day, array[date '2012-02-29', date '0099-01-01'] as days`.execute(
    database.db,
  );
  expect(rows).toEqual([{ day: '2026-03-29', days: ['2012-02-29', '0099-01-01'] }]);
});

test('a whole number comes back exact, and one that no number holds is refused', async () => {
  const exact = await sql<{ n: number }>`select 9007199254740991::int8 as n`.execute(database.db);
  expect(exact.rows[0]?.n).toBe(Number.MAX_SAFE_INTEGER);
  await expect(sql`select 9007199254740993::int8 as n`.execute(database.db)).rejects.toThrow(
    '9007199254740993',
  );
});

test('every wait for the database has a limit, and its clock runs on UTC', async () => {
  const { rows } = await sql<{ name: string; setting: string }>`
    select name, setting from pg_settings
    where name in ('statement_timeout', 'lock_timeout', 'idle_in_transaction_session_timeout', 'TimeZone')
    order by name`.execute(database.db);
  expect(Object.fromEntries(rows.map(({ name, setting }) => [name, setting]))).toEqual({
    TimeZone: 'UTC',
    idle_in_transaction_session_timeout: '30000',
    lock_timeout: '5000',
    statement_timeout: '15000',
  });
});

test('a lost connection fails its own query, and the database is there again', async () => {
  const killed = database.db.connection().execute(async (connection) => {
    const { rows } = await sql<{ pid: number }>`select pg_backend_pid() as pid`.execute(connection);
    await sql`select pg_terminate_backend(${rows[0]?.pid})`.execute(database.db);
    await sql`select 1`.execute(connection);
  });
  await expect(killed).rejects.toThrow();
  // The pool learns of the loss a moment later than the query did.
  const one = () =>
    sql<{ one: number }>`select 1 as one`.execute(database.db).then(({ rows }) => rows[0]?.one);
  await expect.poll(() => one().catch(() => 'lost')).toBe(1);
});

test('a connection that is lost while the pool is being ended is told of to nobody', async () => {
  const warned = vi.spyOn(console, 'warn');
  const pool = createPool({ url: database.url });
  const client = await pool.connect();
  const { rows } = await client.query<{ pid: number }>('select pg_backend_pid() as pid');
  const lost = new Promise<void>((resolve) => client.once('end', resolve));
  const ended = pool.end();
  await sql`select pg_terminate_backend(${rows[0]?.pid})`.execute(database.db);
  await lost;
  client.release();
  await ended;
  expect(warned).not.toHaveBeenCalled();
  warned.mockRestore();
});

test('two transactions that lock each other out both end, one of them at its second try', async () => {
  let runs = 0;
  const both = latch(2);
  const lockBoth = (first: number, second: number) =>
    runTransaction(database.db, async (trx) => {
      runs += 1;
      await sql`select pg_advisory_xact_lock(${first})`.execute(trx);
      await both.arrive();
      await sql`select pg_advisory_xact_lock(${second})`.execute(trx);
      return first;
    });
  expect(await Promise.all([lockBoth(1, 2), lockBoth(2, 1)])).toEqual([1, 2]);
  expect(runs).toBe(3);
});

test('a transaction that fails for a reason of its own runs once and changes nothing', async () => {
  let runs = 0;
  const failing = runTransaction(database.db, async (trx) => {
    runs += 1;
    await sql`create table never_seen ()`.execute(trx);
    throw new Error('the reason');
  });
  await expect(failing).rejects.toThrow('the reason');
  expect(runs).toBe(1);
  const { rows } = await sql<{ found: string | null }>`select to_regclass('never_seen') as found`.execute(
    database.db,
  );
  expect(rows[0]?.found).toBeNull();
});

test('a migrated database is current', async () => {
  expect(await migrationsCurrent(database.db)).toBe(true);
});

/** Lets the first `count` callers go on together, later ones at once. */
function latch(count: number) {
  let open: () => void;
  const opened = new Promise<void>((resolve) => (open = resolve));
  let waiting = 0;
  return {
    arrive: async () => {
      waiting += 1;
      if (waiting >= count) open();
      await opened;
    },
  };
}
