import { afterEach, expect, test } from 'vitest';
import { sql } from 'kysely';
import { startWorkerHere } from '../support/worker';
import { testDatabase } from '../support/database';
import { addUnit } from '../support/fleet';
import { enqueue } from '@/lib/enqueue';
import type { Worker } from '@/jobs/start-worker';

const database = testDatabase();
const workers: Worker[] = [];
const startWorker = async () => {
  const worker = await startWorkerHere(database.url);
  workers.push(worker);
  return worker;
};
afterEach(async () => {
  for (const worker of workers.splice(0)) await worker.stop();
});

const waitingJobs = async () =>
  (
    await sql<{ task_identifier: string }>`select task_identifier from graphile_worker.jobs`.execute(
      database.db,
    )
  ).rows;
const duePoints = () =>
  database.db.selectFrom('due_point').select(['unit_id', 'due_tenths']).orderBy('due_tenths').execute();

test('what is rolled back leaves no job behind', async () => {
  const { unitId } = await addUnit(database.db, { every: 500 });
  await expect(
    database.db.transaction().execute(async (trx) => {
      await enqueue(trx, 'refresh-due', { unitIds: [unitId] });
      throw new Error('changed my mind');
    }),
  ).rejects.toThrow('changed my mind');
  expect(await waitingJobs()).toEqual([]);
});

test('a committed job runs, the due point is there and its task is open', async () => {
  await startWorker();
  const { unitId } = await addUnit(database.db, { every: 500, lead: 100, engineHoursTenths: 450 });
  await enqueue(database.db, 'refresh-due', { unitIds: [unitId] });
  await expect.poll(duePoints, { timeout: 10_000 }).toEqual([{ unit_id: unitId, due_tenths: 500 }]);
  await expect
    .poll(() => database.db.selectFrom('task').select('origin').execute(), { timeout: 10_000 })
    .toEqual([{ origin: 'rule' }]);
  await expect.poll(waitingJobs, { timeout: 10_000 }).toEqual([]);
});
