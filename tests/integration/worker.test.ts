import { afterEach, expect, test } from 'vitest';
import { sql } from 'kysely';
import { setEnvironment, startWorkerHere, workerEnv } from '../support/worker';
import { TIMES } from '@/jobs/crontab';
import { TASKS } from '@/jobs/task-list';
import { refreshFleet } from '@/lib/actions/refresh-fleet';
import { tidy } from '@/lib/actions/tidy';
import { SYSTEM } from '@/lib/domain/access';
import type { JobName } from '@/lib/schemas/jobs';
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

/** Everything jobs write, but for when they looked. */
async function everything(): Promise<unknown> {
  const { rows } = await sql`
    select (select json_agg(p order by p.unit_id, p.trigger_index) from due_point p) as due_points,
           (select json_agg(t order by t.id) from task t) as tasks,
           (select json_agg(a order by a.unit_id) from assessment a) as assessments,
           (select json_agg(m order by m.id) from mail m) as mail,
           (select json_agg(d order by d.id) from digest d) as digests`.execute(database.db);
  return rows;
}

test('each job run twice changes nothing the second time', async () => {
  const { unitId } = await addUnit(database.db, { every: 500, lead: 100, engineHoursTenths: 450 });
  await database.db
    .insertInto('person')
    .values({ email: 'm@wakewright.example', name: 'M', role: 'manager', digest_wanted: true })
    .execute();
  const { id: personId } = await database.db.selectFrom('person').select('id').executeTakeFirstOrThrow();
  // Mon 30 Nov 2026, 07:00 in New York.
  const now = new Date('2026-11-30T12:00:00Z');
  setEnvironment(database.url);
  const ctx = { db: database.db, actor: SYSTEM, now };
  const runs: [JobName, unknown][] = [
    ['refresh-due', { unitIds: [unitId] }],
    ['refresh-fleet', {}],
    ['open-tasks', {}],
    ['send-password-reset', { id: '6f1d0a3e-5b64-4f0e-9a57-0d9be2f6f001', email: 'm@wakewright.example' }],
    ['tick-digests', {}],
    ['send-digest', { personId, weekOn: '2026-11-30' }],
    ['tidy', {}],
  ];
  for (const [name, payload] of runs) await TASKS[name](ctx, payload, workerEnv(database.url));
  const before = await everything();
  expect(JSON.stringify(before)).toContain(unitId);
  for (const [name, payload] of runs) {
    await TASKS[name](ctx, payload, workerEnv(database.url));
    expect(await everything(), name).toEqual(before);
  }
});

test('what is out of date is found by the nightly check', async () => {
  const { unitId } = await addUnit(database.db, { every: 500 });
  const ctx = { db: database.db, actor: SYSTEM, now: new Date() };
  expect(await refreshFleet(ctx)).toEqual({ units: 1, changed: 1 });
  expect(await refreshFleet(ctx)).toEqual({ units: 1, changed: 0 });
  await sql`update due_point set due_tenths = 501 where unit_id = ${unitId}`.execute(database.db);
  expect(await refreshFleet(ctx)).toEqual({ units: 1, changed: 1 });
});

test('what has been over for 30 days is taken away, what is not stays', async () => {
  const now = new Date('2026-11-30T12:00:00Z');
  const letter = (subject: string, queuedAt: string, sent: boolean) => ({
    kind: 'invitation',
    recipient: 'a@wakewright.example',
    subject,
    text_body: '',
    queued_at: new Date(queuedAt),
    sent_at: sent ? new Date(queuedAt) : null,
  });
  await database.db
    .insertInto('mail')
    .values([
      letter('old and sent', '2026-10-31T11:59:59Z', true),
      letter('old, on its way', '2026-10-31T11:59:59Z', false),
      letter('sent lately', '2026-10-31T12:00:00Z', true),
    ])
    .execute();
  await tidy({ db: database.db, actor: SYSTEM, now });
  const left = await database.db.selectFrom('mail').select('subject').orderBy('subject').execute();
  expect(left.map((row) => row.subject)).toEqual(['old, on its way', 'sent lately']);
});

test('the clock’s jobs are kinds that the worker knows, every quarter of an hour and every night', () => {
  expect(TIMES.map(({ task, at }) => `${task} ${at}`)).toEqual([
    'open-tasks */15 * * * *',
    'tick-digests */15 * * * *',
    'refresh-fleet 10 2 * * *',
    'tidy 40 2 * * *',
    'sweep-files 50 2 * * *',
  ]);
  expect(TIMES.filter(({ task }) => !(task in TASKS))).toEqual([]);
});
