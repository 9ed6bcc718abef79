import { afterEach, beforeEach, expect, test } from 'vitest';
import { simpleParser } from 'mailparser';
import { sql } from 'kysely';
import { queueMail } from '@/lib/actions/queue-mail';
import { sendMail } from '@/lib/actions/send-mail';
import { SYSTEM } from '@/lib/domain/access';
import { createDeliver } from '@/lib/mail/deliver';
import type { Worker } from '@/jobs/start-worker';
import { testDatabase } from '../support/database';
import { refusal, startMailServer, type MailServer } from '../support/mail-server';
import { startWorkerHere } from '../support/worker';

const database = testDatabase();
let server: MailServer;
let workers: Worker[] = [];

beforeEach(async () => {
  server = await startMailServer();
  workers = [];
});
afterEach(async () => {
  for (const worker of workers) await worker.stop();
  await server.stop();
});

const startWorkers = async (count: number) => {
  for (let index = 0; index < count; index += 1) {
    workers.push(
      await startWorkerHere(database.url, { SMTP_URL: server.url, MAIL_FROM: 'Dock <a@dock.example>' }),
    );
  }
};
const queue = () =>
  queueMail(
    { db: database.db, now: new Date() },
    { kind: 'digest', to: 'm@wakewright.example', subject: 'Überfällig', text: 'Plain', html: '<p>Rich</p>' },
  );
const letter = (id: string) =>
  database.db
    .selectFrom('mail')
    .select(['sent_at', 'failure'])
    .where('id', '=', id)
    .executeTakeFirstOrThrow();
const isSent = async (id: string) => (await letter(id)).sent_at !== null;
/** Brings the next attempt of a job that is waiting for one forward to now. */
const hurry = () =>
  sql`select graphile_worker.reschedule_jobs(array(select id from graphile_worker.jobs where locked_at is null), now())`.execute(
    database.db,
  );

test('a letter arrives once, with text, HTML and a Message-ID made from its row', async () => {
  await startWorkers(2);
  const id = await queue();
  await expect.poll(() => isSent(id), { timeout: 10_000 }).toBe(true);
  const mail = await simpleParser(server.taken[0] ?? '');
  expect(mail).toMatchObject({
    subject: 'Überfällig',
    text: expect.stringContaining('Plain') as string,
    html: '<p>Rich</p>',
    messageId: `<${id}@dock.example>`,
  });
  expect(server.taken).toHaveLength(1);
});

test.each([
  ['is sent', {}],
  ['will never be', { recipient: (go: (error: Error) => void) => go(refusal(550, 'no such mailbox')) }],
])('what a letter said is forgotten once it %s; what it was stays', async (_, behaviour) => {
  const link = 'https://dock.example/reset/x';
  const id = await queueMail(
    { db: database.db, now: new Date() },
    { kind: 'password-reset', to: 'm@wakewright.example', subject: 'Choose', text: link, html: link },
  );
  const row = () => database.db.selectFrom('mail').selectAll().where('id', '=', id).executeTakeFirstOrThrow();
  expect(await row()).toMatchObject({ text_body: link, html_body: link });
  server.behave(behaviour);
  await startWorkers(1);
  await expect
    .poll(async () => (await row()).sent_at ?? (await row()).failure, { timeout: 10_000 })
    .not.toBeNull();
  expect(await row()).toMatchObject({
    kind: 'password-reset',
    subject: 'Choose',
    text_body: '',
    html_body: null,
  });
});

test('a letter that is sent is not sent again when its job runs twice', async () => {
  await startWorkers(1);
  const id = await queue();
  await expect.poll(() => isSent(id), { timeout: 10_000 }).toBe(true);
  const sentAt = await letter(id);
  await sql`select graphile_worker.add_job('send-mail', json_build_object('mailId', ${id}::text))`.execute(
    database.db,
  );
  await expect
    .poll(() => sql`select 1 from graphile_worker.jobs`.execute(database.db).then(({ rows }) => rows), {
      timeout: 10_000,
    })
    .toEqual([]);
  expect(server.taken).toHaveLength(1);
  expect(await letter(id)).toEqual(sentAt);
});

test('a server that has no room now gets the letter later; it arrives once', async () => {
  let refusals = 0;
  server.behave({
    recipient: (go) => ((refusals += 1) <= 2 ? go(refusal(452, 'no room')) : go()),
  });
  await startWorkers(1);
  const id = await queue();
  await expect
    .poll(
      async () => {
        await hurry();
        return isSent(id);
      },
      { timeout: 20_000 },
    )
    .toBe(true);
  expect({ refusals, taken: server.taken.length, ...(await letter(id)) }).toMatchObject({
    refusals: 3,
    taken: 1,
    failure: null,
  });
});

test('a server that will never take the letter is not asked again, and what it said is kept', async () => {
  server.behave({ recipient: (go) => go(refusal(550, 'no such mailbox')) });
  await startWorkers(1);
  const id = await queue();
  await expect
    .poll(async () => (await letter(id)).failure ?? '', { timeout: 10_000 })
    .toContain('no such mailbox');
  await expect
    .poll(() => sql`select 1 from graphile_worker.jobs`.execute(database.db).then(({ rows }) => rows), {
      timeout: 10_000,
    })
    .toEqual([]);
  expect(await isSent(id)).toBe(false);
});

test('a sender whose claim ran out before the server was ready for the letter sends nothing', async () => {
  let letGo: () => void = () => undefined;
  const arrived = new Promise<void>((arrive) => {
    server.behave({
      recipient: (go) => {
        server.behave({});
        letGo = () => go();
        arrive();
      },
    });
  });
  const mailId = await queue();
  const send = (claimMs: number) => {
    const deliver = createDeliver({ smtpUrl: server.url, from: 'a@dock.example' });
    const ctx = { db: database.db, actor: SYSTEM, now: new Date() };
    return sendMail(ctx, { mailId }, { deliver, claimMs, renewMs: 60_000 });
  };
  const slow = send(500);
  await arrived;
  await expect(send(500)).rejects.toThrow('in the hands of another run');
  await expect
    .poll(
      () =>
        send(500).then(
          () => isSent(mailId),
          () => false,
        ),
      { timeout: 10_000 },
    )
    .toBe(true);
  letGo();
  await expect(slow).rejects.toThrow('the claim on the letter was lost');
  expect(server.taken).toHaveLength(1);
});

test('a server that hangs up in the middle of the conversation gets the letter again, and keeps one', async () => {
  let calls = 0;
  server.behave({
    greet: (go) => {
      calls += 1;
      if (calls === 1) go(refusal(421, 'going down'));
      else go();
    },
    body: (go) => {
      if (calls === 2) go(refusal(451, 'lost my disk'));
      else go();
    },
  });
  await startWorkers(1);
  const id = await queue();
  await expect
    .poll(
      async () => {
        await hurry();
        return isSent(id);
      },
      { timeout: 20_000 },
    )
    .toBe(true);
  expect({ calls, taken: server.taken.length }).toEqual({ calls: 3, taken: 1 });
});
