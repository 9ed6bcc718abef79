import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { simpleParser } from 'mailparser';
import { sql } from 'kysely';
import { refreshDue } from '@/lib/actions/refresh-due';
import { sendDigest } from '@/lib/actions/send-digest';
import { tickDigests } from '@/lib/actions/tick-digests';
import type { DigestPreview } from '@/lib/schemas/digest';
import { asSystem } from '../support/crew';
import { testDatabase } from '../support/database';
import { addUnit } from '../support/fleet';
import { testApi, type Caller } from '../support/http';
import { startMailServer, type MailServer } from '../support/mail-server';
import { startWorkerHere } from '../support/worker';

const database = testDatabase();
const api = testApi(database);

// Mon 30 Nov 2026, 07:00 in New York.
const MONDAY = '2026-11-30T12:00:00Z';
const WEEK = '2026-11-30';
let manager: Caller;
let unit: { unitId: string; dockId: string };

beforeEach(async () => {
  unit = await addUnit(database.db, { every: 500, engineHoursTenths: 512, timeZone: 'America/New_York' });
  await refreshDue(asSystem(database.db, MONDAY), { unitIds: [unit.unitId] });
  manager = await api.caller('manager');
  await manager.send('PATCH', '/account', { digestWanted: true });
});

const send = (now = MONDAY, weekOn = WEEK) =>
  sendDigest(asSystem(database.db, now), { personId: manager.personId, weekOn });
const letters = () => database.db.selectFrom('mail').selectAll().where('kind', '=', 'digest').execute();
const digests = () => database.db.selectFrom('digest').selectAll().execute();
const isWanted = async () =>
  (
    await database.db
      .selectFrom('person')
      .select('digest_wanted')
      .where('id', '=', manager.personId)
      .executeTakeFirst()
  )?.digest_wanted;
const key = async () =>
  (
    await database.db
      .selectFrom('person')
      .select('unsubscribe_key')
      .where('id', '=', manager.personId)
      .executeTakeFirstOrThrow()
  ).unsubscribe_key;
const digestJobs = async () =>
  (
    await sql<{
      key: string;
    }>`select key from graphile_worker.jobs where task_identifier = 'send-digest'`.execute(database.db)
  ).rows.map((row) => row.key);

describe('once a week', () => {
  test('at 06:00 on Monday the tick asks for each digest once, also when it ticks again', async () => {
    await tickDigests(asSystem(database.db, '2026-11-30T10:45:00Z'));
    expect(await digestJobs()).toEqual([]);
    await tickDigests(asSystem(database.db, '2026-11-30T11:00:00Z'));
    await tickDigests(asSystem(database.db, '2026-11-30T11:15:00Z'));
    expect(await digestJobs()).toEqual([`send-digest:${manager.personId}:${WEEK}`]);
    await send();
    await sql`delete from graphile_worker._private_jobs`.execute(database.db);
    await tickDigests(asSystem(database.db, '2026-11-30T11:30:00Z'));
    expect(await digestJobs()).toEqual([]);
  });

  test('four runs at the same moment make one letter, and a fifth none', async () => {
    await Promise.all([send(), send(), send(), send()]);
    await send();
    expect(await letters()).toHaveLength(1);
    expect(await digests()).toMatchObject([{ person_id: manager.personId, week_on: WEEK }]);
    await send('2026-12-07T12:00:00Z', '2026-12-07');
    expect(await letters()).toHaveLength(2);
  });

  test('nobody gets last week’s news on a Wednesday, and nobody who does not want it gets it', async () => {
    await send('2026-12-02T12:00:00Z');
    await manager.send('PATCH', '/account', { digestWanted: false });
    await send();
    expect(await letters()).toEqual([]);
    expect(await digests()).toEqual([]);
  });

  test('a digest that could not be composed leaves no trace, so the next run sends it', async () => {
    await sql`alter table closure rename to closure_away`.execute(database.db);
    await expect(send()).rejects.toThrow('closure');
    await sql`alter table closure_away rename to closure`.execute(database.db);
    expect(await digests()).toEqual([]);
    await send();
    expect(await letters()).toHaveLength(1);
  });
});

describe('the letter', () => {
  let server: MailServer;
  let workers: Awaited<ReturnType<typeof startWorkerHere>>[] = [];
  beforeEach(async () => {
    server = await startMailServer();
  });
  afterEach(async () => {
    for (const worker of workers) await worker.stop();
    workers = [];
    await server.stop();
  });

  test('two workers send it once, with one-click unsubscribe as RFC 8058 wants it, and the week is marked sent', async () => {
    for (let count = 0; count < 2; count += 1) {
      workers.push(await startWorkerHere(database.url, { SMTP_URL: server.url }));
    }
    await Promise.all([send(), send()]);
    await expect.poll(async () => (await digests())[0]?.sent_at ?? null, { timeout: 15_000 }).not.toBeNull();
    expect(server.taken).toHaveLength(1);
    const mail = await simpleParser(server.taken[0] ?? '');
    const headers = Object.fromEntries(mail.headerLines.map(({ key: name, line }) => [name, line]));
    const address = `${process.env.PUBLIC_URL}/api/v1/unsubscribe/${await key()}`;
    expect(headers['list-unsubscribe']?.replace(/\s+/g, ' ')).toBe(`List-Unsubscribe: <${address}>`);
    expect(headers['list-unsubscribe-post']).toBe('List-Unsubscribe-Post: List-Unsubscribe=One-Click');
    expect(mail.subject).toContain('Week of Mon 30 Nov 2026: 1 overdue');
    expect(mail.text).toContain('overdue by 1.2 h; holds the unit');
    expect(mail.html).toContain(`${process.env.PUBLIC_URL}/units/${unit.unitId}`);
  });
});

describe('unsubscribing', () => {
  const call = async (method: string, path: string) =>
    fetch(`${process.env.PUBLIC_URL}/api/v1/unsubscribe/${path}`, {
      method,
      redirect: 'manual',
      ...(method === 'POST' && {
        body: 'List-Unsubscribe=One-Click',
        headers: { 'content-type': 'application/x-www-form-urlencoded' },
      }),
    });

  test('one POST without cookies ends it, without a redirect, and a second is no different', async () => {
    for (let again = 0; again < 2; again += 1) {
      const response = await call('POST', await key());
      expect(response.status).toBe(200);
      expect(await isWanted()).toBe(false);
    }
  });

  test('looking at the address shows a button and ends nothing', async () => {
    const response = await call('GET', await key());
    expect(response.status).toBe(200);
    expect(await response.text()).toContain('<button>Stop the letters</button>');
    expect(await isWanted()).toBe(true);
  });

  test('a key of nobody’s and one that is no key are told apart from ours, and end nothing', async () => {
    expect((await call('POST', '00000000-0000-4000-8000-000000000000')).status).toBe(404);
    const malformed = await call('POST', 'nonsense');
    expect(malformed.status).toBe(422);
    expect(await malformed.json()).toMatchObject({ errors: [{ path: 'key' }] });
    expect(await isWanted()).toBe(true);
  });
});

describe('on screen', () => {
  test('the preview shows what would be sent, and sends and counts nothing', async () => {
    const { status, body } = await manager.send<DigestPreview>('GET', '/digest/preview');
    expect(status).toBe(200);
    expect(body).toMatchObject({ wanted: true, totals: { overdue: 1, held: 1 } });
    expect(body.html).toContain('overdue by 1.2 h');
    expect([await letters(), await digests()]).toEqual([[], []]);
  });

  test('“send me this now” sends without taking the week’s place, three times at most', async () => {
    for (let count = 0; count < 3; count += 1) {
      expect((await manager.send('POST', '/digest/sending')).status).toBe(202);
    }
    const fourth = await manager.send('POST', '/digest/sending');
    expect(fourth).toMatchObject({ status: 429, body: { code: 'too_many_attempts' } });
    expect(await digests()).toEqual([]);
    await send();
    expect(await letters()).toHaveLength(4);
  });

  test('a week that does not begin on a Monday, or has not begun, is refused by name', async () => {
    for (const weekOn of ['2026-12-01', '2026-02-30', '2099-01-05']) {
      const { status, body } = await manager.send('GET', `/digest/preview?weekOn=${weekOn}`);
      expect({ status, errors: body.errors }).toMatchObject({ status: 422, errors: [{ path: 'weekOn' }] });
    }
  });

  test('it is for managers, of the docks they see', async () => {
    const mechanic = await api.caller('mechanic');
    expect((await mechanic.send('GET', '/digest/preview')).status).toBe(403);
    expect((await mechanic.send('POST', '/digest/sending')).status).toBe(403);
    const elsewhere = await addUnit(database.db);
    const other = await api.caller('manager', { dockIds: [elsewhere.dockId] });
    expect((await other.send<DigestPreview>('GET', '/digest/preview')).body.totals.overdue).toBe(0);
  });
});
