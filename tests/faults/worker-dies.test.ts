import { afterEach, beforeEach, expect, test } from 'vitest';
import { sql } from 'kysely';
import { queueMail } from '@/lib/actions/queue-mail';
import { enqueue } from '@/lib/enqueue';
import { testDatabase } from '../support/database';
import { addUnit } from '../support/fleet';
import { startMailServer, type MailServer } from '../support/mail-server';
import { spawnWorker, type WorkerProcess } from '../support/worker';

const database = testDatabase();
let server: MailServer;
let started: WorkerProcess[] = [];
const deadline = { timeout: 30_000, interval: 50 };

beforeEach(async () => {
  server = await startMailServer();
  started = [];
});
afterEach(async () => {
  for (const worker of started) {
    signal(worker, 'SIGCONT');
    await worker.stop();
  }
  await server.stop();
});

async function startWorker(settings: Record<string, string> = {}): Promise<WorkerProcess> {
  const worker = spawnWorker(database.url, { SMTP_URL: server.url, ...settings });
  started.push(worker);
  await worker.ready;
  return worker;
}

function signal(worker: WorkerProcess, name: NodeJS.Signals): void {
  try {
    process.kill(worker.pid, name);
  } catch {
    // It has ended already.
  }
}

const queueLetter = () =>
  queueMail(
    { db: database.db, now: new Date() },
    { kind: 'invitation', to: 'm@wakewright.example', subject: 'Once', text: 'Only once' },
  );
const isSent = async (id: string) =>
  (await database.db.selectFrom('mail').select('sent_at').where('id', '=', id).executeTakeFirstOrThrow())
    .sent_at !== null;
const jobsLeft = async () =>
  (await sql<{ locked_by: string | null }>`select locked_by from graphile_worker.jobs`.execute(database.db))
    .rows;
const liveWorkers = async () =>
  (
    await database.db
      .selectFrom('worker_heartbeat')
      .select('worker_id')
      .where('stopped_at', 'is', null)
      .execute()
  ).length;

/** Keeps the first client that names its recipient waiting; answers when it is there. */
function holdFirstRecipient() {
  let arrive: () => void = () => undefined;
  let letGo: () => void = () => undefined;
  const arrived = new Promise<void>((resolve) => (arrive = resolve));
  let first = true;
  server.behave({
    recipient: (go) => {
      if (!first) return go();
      first = false;
      letGo = () => go();
      arrive();
    },
  });
  return { arrived, letGo: () => letGo() };
}

test('a worker killed while it sends a letter: another sends it within 30 seconds, once', async () => {
  const held = holdFirstRecipient();
  const first = await startWorker();
  const id = await queueLetter();
  await held.arrived;
  await startWorker();
  signal(first, 'SIGKILL');
  await expect.poll(() => isSent(id), deadline).toBe(true);
  await expect.poll(jobsLeft, deadline).toEqual([]);
  expect(server.taken).toHaveLength(1);
});

test('a worker killed while it computes due points: the one started next takes its job up', async () => {
  const { unitId } = await addUnit(database.db, { every: 500 });
  const first = await startWorker();
  await database.db.transaction().execute(async (trx) => {
    await sql`select 1 from assessment where unit_id = ${unitId} for update`.execute(trx);
    await enqueue(database.db, 'refresh-due', { unitIds: [unitId] });
    await expect.poll(async () => (await jobsLeft())[0]?.locked_by ?? null, deadline).not.toBeNull();
    signal(first, 'SIGKILL');
    await first.exited;
  });
  await startWorker();
  await expect
    .poll(() => database.db.selectFrom('due_point').select('due_tenths').execute(), deadline)
    .toEqual([{ due_tenths: 500 }]);
  await expect.poll(jobsLeft, deadline).toEqual([]);
});

test('a worker stopped past the limit while it sends: another sends; revived, it sends nothing and ends', async () => {
  const held = holdFirstRecipient();
  const first = await startWorker();
  const id = await queueLetter();
  await held.arrived;
  await startWorker();
  signal(first, 'SIGSTOP');
  await expect.poll(() => isSent(id), deadline).toBe(true);
  held.letGo();
  signal(first, 'SIGCONT');
  await expect(first.exited).resolves.toMatchObject({ code: 75 });
  await expect.poll(jobsLeft, deadline).toEqual([]);
  expect(server.taken).toHaveLength(1);
  expect(await liveWorkers()).toBe(1);
});

test('a worker asked to end finishes its letter first', async () => {
  const held = holdFirstRecipient();
  const worker = await startWorker();
  const id = await queueLetter();
  await held.arrived;
  signal(worker, 'SIGTERM');
  held.letGo();
  await expect(worker.exited).resolves.toMatchObject({ code: 0 });
  expect(await isSent(id)).toBe(true);
  expect(await jobsLeft()).toEqual([]);
  expect(await liveWorkers()).toBe(0);
});

test('a worker asked to end while its letter does not get away gives it back for the next to send', async () => {
  const held = holdFirstRecipient();
  const worker = await startWorker();
  const id = await queueLetter();
  await held.arrived;
  signal(worker, 'SIGTERM');
  await worker.exited;
  await startWorker();
  await expect
    .poll(async () => {
      await sql`select graphile_worker.reschedule_jobs(array(
        select id from graphile_worker.jobs where locked_at is null), now())`.execute(database.db);
      return isSent(id);
    }, deadline)
    .toBe(true);
  expect(server.taken).toHaveLength(1);
});
