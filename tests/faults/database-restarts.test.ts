import { afterAll, beforeAll, expect, test } from 'vitest';
import { execFile } from 'node:child_process';
import { promisify } from 'node:util';
import type { Kysely } from 'kysely';
import { createDatabase } from '@/db/client';
import { withDatabase } from '@/db/databases';
import type { LocalServer } from '@/db/local-server';
import type { DB } from '@/db/tables';
import { enqueue } from '@/lib/enqueue';
import { scriptCommand } from '@/lib/launch/commands';
import { TEMPLATE } from '../support/database-names';
import { addUnit } from '../support/fleet';
import { testApi, type Caller } from '../support/http';
import { startThrowawayServer } from '../support/throwaway-server';
import { spawnWorker, type WorkerProcess } from '../support/worker';

const deadline = { timeout: 60_000, interval: 100 };
const where = { url: '' };
let server: LocalServer;
let db: Kysely<DB>;
let worker: WorkerProcess;

beforeAll(async () => {
  // What is committed must be there after a hard stop.
  server = await startThrowawayServer({ synchronous_commit: 'on' });
  const prepare = scriptCommand('tests/support/prepare.ts', server.url('postgres'));
  await promisify(execFile)(prepare.command, prepare.args);
  where.url = withDatabase(server.url('postgres'), TEMPLATE);
  db = createDatabase({ url: where.url });
  worker = spawnWorker(where.url);
  await worker.ready;
});
const api = testApi(where);
afterAll(async () => {
  await worker.stop();
  await db.destroy();
  await server.stop();
});

const duePoints = async (unitId: string) =>
  (await db.selectFrom('due_point').select('due_tenths').where('unit_id', '=', unitId).execute()).map(
    (row) => row.due_tenths,
  );
const isReady = async (caller: Caller) => (await caller.send('GET', '/ready')).status;

test('the database restarts under the web server and the worker: both go on, in the same processes', async () => {
  const caller = await api.caller('manager');
  const before = await addUnit(db, { every: 500 });
  await enqueue(db, 'refresh-due', { unitIds: [before.unitId] });
  await expect.poll(() => duePoints(before.unitId), deadline).toEqual([500]);

  await server.restart();

  await expect.poll(() => isReady(caller), deadline).toBe(200);
  expect((await caller.send<{ items: unknown[] }>('GET', '/units')).body.items).toHaveLength(1);
  const after = await addUnit(db, { every: 700 });
  await enqueue(db, 'refresh-due', { unitIds: [after.unitId] });
  await expect.poll(() => duePoints(after.unitId), deadline).toContain(700);
  await expect
    .poll(() => db.selectFrom('worker_heartbeat').select('stopped_at').execute(), deadline)
    .toEqual([{ stopped_at: null }]);
  expect(worker.output.join('\n')).not.toContain('ending');
});
