import { sql } from 'kysely';
import { expect, test } from 'vitest';
import { workerStatus } from '@/lib/actions/worker-status';
import { enqueue } from '@/lib/enqueue';
import { asSystem } from '../support/crew';
import { testDatabase } from '../support/database';
import { testApi } from '../support/http';
import { startWorkerHere } from '../support/worker';

const database = testDatabase();
testApi(database);

const status = () => workerStatus(asSystem(database.db, new Date()));
const ask = async (path: string) => {
  const response = await fetch(`${process.env.PUBLIC_URL}/api/v1${path}`);
  return { status: response.status, body: (await response.json()) as unknown };
};
const wait = (seconds: number) =>
  sql`update graphile_worker._private_jobs set run_at = now() - ${seconds} * interval '1 second'`.execute(
    database.db,
  );

test('anybody may ask whether the process is up and whether it can answer', async () => {
  expect(await ask('/health')).toEqual({ status: 200, body: { status: 'up' } });
  expect(await ask('/ready')).toEqual({
    status: 200,
    body: { database: 'reached', migrations: 'current', worker: { lagSeconds: 0, alive: false, workers: 0 } },
  });
});

test('a server whose database lacks a migration is not ready', async () => {
  await sql`alter table kysely_migration rename to kysely_migration_away`.execute(database.db);
  const { status: code, body } = await ask('/ready');
  await sql`alter table kysely_migration_away rename to kysely_migration`.execute(database.db);
  expect({ code, body }).toMatchObject({ code: 503, body: { code: 'unavailable' } });
});

test('the lag is the age of the job that waits longest, also when a dead worker has it', async () => {
  await enqueue(database.db, 'open-tasks', {});
  await wait(90);
  expect((await status()).lagSeconds).toBeGreaterThanOrEqual(90);
  await sql`update graphile_worker._private_jobs set locked_by = 'pool-dead', locked_at = now()`.execute(
    database.db,
  );
  expect((await status()).lagSeconds).toBeGreaterThanOrEqual(90);
  await sql`insert into worker_heartbeat (worker_id, started_at, beat_at) values ('pool-dead', now(), now())`.execute(
    database.db,
  );
  expect(await status()).toEqual({ lagSeconds: 0, alive: true, workers: 1 });
});

test('a job that is to run later, or has failed for good, is no lag', async () => {
  await enqueue(database.db, 'open-tasks', {}, { runAt: new Date(Date.now() + 3_600_000) });
  expect((await status()).lagSeconds).toBe(0);
  await wait(90);
  await sql`update graphile_worker._private_jobs set attempts = max_attempts`.execute(database.db);
  expect((await status()).lagSeconds).toBe(0);
});

test('a worker that runs is alive, and one that has ended is not', async () => {
  const worker = await startWorkerHere(database.url);
  await expect.poll(status, { timeout: 10_000 }).toEqual({ lagSeconds: 0, alive: true, workers: 1 });
  await worker.stop();
  expect((await status()).alive).toBe(false);
});
