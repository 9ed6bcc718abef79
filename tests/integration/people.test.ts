import { sql } from 'kysely';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import type { Person } from '@/lib/schemas/person';
import { startApp, type App } from '../support/app';
import { openBrowser, sendFrom, type Browser } from '../support/browser';
import { addDock } from '../support/craft';
import { testDatabase } from '../support/database';
import { addStaff, PASSWORD, sendAskedResets, tokenInLetter } from '../support/people';
import { setEnvironment } from '../support/worker';

const database = testDatabase();
let app: App;
let [ada, marlo]: Person[] = [];
let manager: Browser;
let north = '';

beforeAll(async () => {
  app = await startApp({ databaseUrl: database.url, worker: false });
}, 300_000);
afterAll(() => app.stop());
beforeEach(async () => {
  setEnvironment(database.url);
  ada = await addStaff(database.db, 'Ada', 'manager');
  marlo = await addStaff(database.db, 'Marlo', 'mechanic');
  north = await addDock(database.db, 'North dock');
  manager = await signedIn(ada.email);
});

async function signedIn(email: string, password = PASSWORD): Promise<Browser> {
  const browser = openBrowser(app.baseUrl);
  expect((await browser.signIn(email, password)).status).toBe(200);
  return browser;
}
const visitor = () => openBrowser(app.baseUrl);
const NEW_PASSWORD = 'seven knots on the ebb';
const PIA = { name: 'Pia', email: 'pia@wakewright.example', role: 'dock' };

/** How many letters wait for the worker: each with its own job. */
async function lettersQueued(): Promise<number> {
  const letters = await database.db.selectFrom('mail').select('id').execute();
  const { rows } = await sql<{ mail_id: string }>`
    select payload ->> 'mailId' as mail_id from graphile_worker._private_jobs`.execute(database.db);
  expect(rows.map((row) => row.mail_id).sort()).toEqual(letters.map((letter) => letter.id).sort());
  return letters.length;
}

describe('an invitation', () => {
  test('makes a person of the role and docks it names, who chose their own password', async () => {
    const invited = await sendFrom(manager, 'POST', '/invitations', { ...PIA, dockIds: [north] });
    expect(invited.status).toBe(201);
    expect(JSON.stringify(invited.body)).not.toMatch(/token/);
    const token = await tokenInLetter(database.db, 'invitation', PIA.email);
    const page = await (await visitor().fetch(`/invitation/${token}`)).text();
    expect(page).toContain('Harbour Test Hire');
    const body = { token, password: NEW_PASSWORD, name: 'Pia Sound' };
    const accepted = await sendFrom(visitor(), 'POST', '/invitations/acceptance', body);
    expect(accepted.status).toBe(201);
    const pia = await signedIn(PIA.email, NEW_PASSWORD);
    expect((await sendFrom(pia, 'GET', '/account')).body).toMatchObject({
      name: 'Pia Sound',
      role: 'dock',
      dockIds: [north],
    });
    expect((await sendFrom(manager, 'GET', '/invitations')).body.items).toEqual([]);
  });

  test('works once, also for two at the same time', async () => {
    await sendFrom(manager, 'POST', '/invitations', PIA);
    const token = await tokenInLetter(database.db, 'invitation', PIA.email);
    const accept = () =>
      sendFrom(visitor(), 'POST', '/invitations/acceptance', { token, password: NEW_PASSWORD });
    const statuses = (await Promise.all([accept(), accept()])).map((answer) => answer.status);
    expect(statuses.sort()).toEqual([201, 404]);
    expect((await accept()).body).toMatchObject({ code: 'not_found', errors: [{ path: 'token' }] });
  });

  test('that was sent again works by the new link alone, and one withdrawn by none', async () => {
    const { body } = await sendFrom(manager, 'POST', '/invitations', PIA);
    const first = await tokenInLetter(database.db, 'invitation', PIA.email);
    expect((await sendFrom(manager, 'POST', `/invitations/${String(body.id)}/letters`)).status).toBe(201);
    const second = await tokenInLetter(database.db, 'invitation', PIA.email);
    expect(second).not.toBe(first);
    const accept = (token: string) =>
      sendFrom(visitor(), 'POST', '/invitations/acceptance', { token, password: NEW_PASSWORD });
    expect((await accept(first)).status).toBe(404);
    expect((await sendFrom(manager, 'DELETE', `/invitations/${String(body.id)}`)).status).toBe(204);
    expect((await accept(second)).status).toBe(404);
    expect((await visitor().fetch(`/invitation/${second}`)).status).toBe(200);
  });

  test('works for seven days', async () => {
    const { body } = await sendFrom(manager, 'POST', '/invitations', PIA);
    const days = (Date.parse(String(body.expiresAt)) - Date.parse(String(body.invitedAt))) / 86_400_000;
    expect(days).toBe(7);
    const token = await tokenInLetter(database.db, 'invitation', PIA.email);
    await database.db.updateTable('invitation').set({ expires_at: new Date() }).execute();
    const body2 = { token, password: NEW_PASSWORD };
    expect((await sendFrom(visitor(), 'POST', '/invitations/acceptance', body2)).status).toBe(404);
  });

  test('is refused for somebody who is here or invited already, and queues no letter then', async () => {
    await sendFrom(manager, 'POST', '/invitations', PIA);
    const queued = await lettersQueued();
    for (const email of [PIA.email.toUpperCase(), marlo!.email]) {
      const again = await sendFrom(manager, 'POST', '/invitations', { ...PIA, email });
      expect(again.status).toBe(409);
      expect(again.body).toMatchObject({ errors: [{ path: 'email' }] });
    }
    expect(await lettersQueued()).toBe(queued);
  });

  test.each([
    ['email', { email: 'nobody' }],
    ['role', { role: 'captain' }],
    ['name', { name: ' ' }],
    ['dockIds.0', { dockIds: ['6f1d0a3e-5b64-4f0e-9a57-0d9be2f6f001'] }],
    ['admin', { admin: true }],
  ])('with a bad %s is refused by that name', async (path, wrong) => {
    const answer = await sendFrom(manager, 'POST', '/invitations', { ...PIA, ...wrong });
    expect(answer.status).toBeGreaterThanOrEqual(400);
    expect(answer.body).toMatchObject({ errors: [{ path }] });
    expect(await lettersQueued()).toBe(0);
  });

  test('with a password that is too common is refused and can be tried again', async () => {
    await sendFrom(manager, 'POST', '/invitations', PIA);
    const token = await tokenInLetter(database.db, 'invitation', PIA.email);
    const accept = (password: string) =>
      sendFrom(visitor(), 'POST', '/invitations/acceptance', { token, password });
    expect((await accept('passwordpassword')).body).toMatchObject({ errors: [{ path: 'password' }] });
    expect((await accept(PIA.email)).status).toBe(422);
    expect((await accept(NEW_PASSWORD)).status).toBe(201);
  });

  test('is a manager’s of all docks to send', async () => {
    const mechanic = await signedIn(marlo!.email);
    const some = await signedIn((await addStaff(database.db, 'Bea', 'manager', [north])).email);
    for (const browser of [mechanic, some]) {
      expect((await sendFrom(browser, 'POST', '/invitations', PIA)).status).toBe(403);
      expect((await sendFrom(browser, 'GET', '/people')).status).toBe(403);
    }
  });
});

describe('a forgotten password', () => {
  const ask = async (email: string) => {
    const answer = await sendFrom(visitor(), 'POST', '/password-resets', { email });
    await sendAskedResets(database.db);
    return answer;
  };

  test('is replaced by a link that works once and ends every session', async () => {
    const before = await signedIn(marlo!.email);
    expect((await ask(marlo!.email)).status).toBe(202);
    const token = await tokenInLetter(database.db, 'password-reset', marlo!.email);
    const reset = () =>
      sendFrom(visitor(), 'POST', '/password-resets/completion', { token, password: NEW_PASSWORD });
    expect((await Promise.all([reset(), reset()])).map(({ status }) => status).sort()).toEqual([204, 404]);
    expect(await before.isSignedIn()).toBe(false);
    expect((await visitor().signIn(marlo!.email, PASSWORD)).status).toBe(401);
    await signedIn(marlo!.email, NEW_PASSWORD);
  });

  test('is asked for with the same answer whether or not anybody has the address', async () => {
    const known = await ask(marlo!.email);
    const unknown = await ask('nobody@wakewright.example');
    expect(unknown).toEqual(known);
    const letters = await database.db.selectFrom('mail').select('recipient').execute();
    expect(letters).toEqual([{ recipient: marlo!.email }]);
  });

  test('brings three letters an hour at most', async () => {
    for (let n = 0; n < 5; n += 1) expect((await ask(marlo!.email)).status).toBe(202);
    expect(await lettersQueued()).toBe(3);
  });

  test('has a link that works for an hour', async () => {
    await ask(marlo!.email);
    const token = await tokenInLetter(database.db, 'password-reset', marlo!.email);
    const { asked_at, expires_at } = await database.db
      .selectFrom('password_reset')
      .select(['asked_at', 'expires_at'])
      .executeTakeFirstOrThrow();
    expect(expires_at.getTime() - asked_at.getTime()).toBe(3_600_000);
    await database.db.updateTable('password_reset').set({ expires_at: new Date() }).execute();
    const body = { token, password: NEW_PASSWORD };
    expect((await sendFrom(visitor(), 'POST', '/password-resets/completion', body)).status).toBe(404);
  });
});

describe('the last manager of all docks', () => {
  test.each([
    ['role', 'PATCH', '', { role: 'mechanic' }],
    ['id', 'POST', '/deactivation', undefined],
  ] as const)('cannot lose it (%s)', async (path, method, below, body) => {
    const answer = await sendFrom(manager, method, `/people/${ada!.id}${below}`, body);
    expect(answer.status).toBe(409);
    expect(answer.body).toMatchObject({ code: 'conflict', errors: [{ path }] });
    expect(await manager.isSignedIn()).toBe(true);
  });

  test('cannot be given some docks only', async () => {
    const answer = await sendFrom(manager, 'PATCH', `/people/${ada!.id}`, { dockIds: [north] });
    expect(answer.body).toMatchObject({ code: 'conflict', errors: [{ path: 'dockIds' }] });
  });

  test('stays when two step down at the same time', async () => {
    const bea = await addStaff(database.db, 'Bea', 'manager');
    const other = await signedIn(bea.email);
    const answers = await Promise.all([
      sendFrom(manager, 'POST', `/people/${bea.id}/deactivation`),
      sendFrom(other, 'POST', `/people/${ada!.id}/deactivation`),
    ]);
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1);
    const left = await database.db
      .selectFrom('person')
      .select('id')
      .where('role', '=', 'manager')
      .where('deactivated_at', 'is', null)
      .execute();
    expect(left).toHaveLength(1);
  });
});

describe('one’s own account', () => {
  test('a changed password ends every other session and tells the owner', async () => {
    const [here, there] = [await signedIn(marlo!.email), await signedIn(marlo!.email)];
    const change = (currentPassword: string, newPassword: string) =>
      sendFrom(here, 'PUT', '/account/password', { currentPassword, newPassword });
    expect((await change('not my password', NEW_PASSWORD)).body).toMatchObject({
      errors: [{ path: 'currentPassword' }],
    });
    expect((await change(PASSWORD, 'too short')).body).toMatchObject({ errors: [{ path: 'newPassword' }] });
    expect((await change(PASSWORD, NEW_PASSWORD)).status).toBe(204);
    expect(await here.isSignedIn()).toBe(true);
    expect(await there.isSignedIn()).toBe(false);
    const letters = await database.db.selectFrom('mail').select(['kind', 'recipient']).execute();
    expect(letters).toEqual([{ kind: 'password-changed', recipient: marlo!.email }]);
  });

  test('guesses at one’s own password have to wait too', async () => {
    const here = await signedIn(marlo!.email);
    const statuses: number[] = [];
    for (let n = 0; n < 6; n += 1) {
      const body = { currentPassword: `wrong guess ${n}`, newPassword: NEW_PASSWORD };
      statuses.push((await sendFrom(here, 'PUT', '/account/password', body)).status);
    }
    expect(statuses).toEqual([422, 422, 422, 422, 422, 429]);
    expect((await visitor().signIn(marlo!.email, PASSWORD)).status).toBe(200);
  });

  test('signing out everywhere ends this session too', async () => {
    const [here, there] = [await signedIn(marlo!.email), await signedIn(marlo!.email)];
    expect((await sendFrom(here, 'DELETE', '/account/sessions')).status).toBe(204);
    expect(await here.isSignedIn()).toBe(false);
    expect(await there.isSignedIn()).toBe(false);
  });

  test('a name is one’s own to change, the digest a manager’s to want', async () => {
    const here = await signedIn(marlo!.email);
    expect((await sendFrom(here, 'PATCH', '/account', { name: 'Marlo Fender' })).body.name).toBe(
      'Marlo Fender',
    );
    const refused = await sendFrom(here, 'PATCH', '/account', { digestWanted: true });
    expect(refused.status).toBe(403);
    expect((await sendFrom(here, 'PATCH', '/account', { role: 'manager' })).status).toBe(422);
    expect((await sendFrom(manager, 'PATCH', '/account', { digestWanted: false })).body.digestWanted).toBe(
      false,
    );
  });
});

describe('an API key', () => {
  const byKey = (key: unknown, path = '/account', method = 'GET', body?: unknown) =>
    fetch(`${app.baseUrl}/api/v1${path}`, {
      method,
      headers: { authorization: `Bearer ${String(key)}`, 'content-type': 'application/json' },
      ...(body !== undefined && { body: JSON.stringify(body) }),
    });

  test('acts for its owner, is shown once, notes its use, and ends when revoked', async () => {
    const { status, body } = await sendFrom(manager, 'POST', '/api-keys', { name: 'Till' });
    expect(status).toBe(201);
    expect((await byKey(body.key)).status).toBe(200);
    const { items } = (await sendFrom(manager, 'GET', '/api-keys')).body as {
      items: Record<string, unknown>[];
    };
    expect(items).toHaveLength(1);
    expect(items[0]).toMatchObject({ name: 'Till', prefix: String(body.key).slice(0, 8) });
    expect(items[0]!.lastUsedAt).not.toBeNull();
    expect(JSON.stringify(items)).not.toContain(String(body.key));
    await byKey(body.key);
    const again = (await sendFrom(manager, 'GET', '/api-keys')).body as { items: Record<string, unknown>[] };
    expect(again.items[0]!.lastUsedAt, 'noted once a minute at most').toBe(items[0]!.lastUsedAt);
    expect((await sendFrom(manager, 'DELETE', `/api-keys/${String(body.id)}`)).status).toBe(204);
    expect((await byKey(body.key)).status).toBe(401);
  });

  test('cannot make another key, nor change the password', async () => {
    const { body } = await sendFrom(manager, 'POST', '/api-keys', { name: 'Till' });
    expect((await byKey(body.key, '/api-keys', 'POST', { name: 'More' })).status).toBe(403);
    const change = { currentPassword: PASSWORD, newPassword: NEW_PASSWORD };
    expect((await byKey(body.key, '/account/password', 'PUT', change)).status).toBe(403);
  });

  test('is a manager’s to make, and nobody else’s to revoke', async () => {
    const mechanic = await signedIn(marlo!.email);
    expect((await sendFrom(mechanic, 'POST', '/api-keys', { name: 'Till' })).status).toBe(403);
    const { body } = await sendFrom(manager, 'POST', '/api-keys', { name: 'Till' });
    expect((await sendFrom(mechanic, 'DELETE', `/api-keys/${String(body.id)}`)).status).toBe(404);
    expect((await byKey(body.key)).status).toBe(200);
  });
});

describe('pages', () => {
  test('send nobody in without signing in, and back to where they were going', async () => {
    const answer = await visitor().fetch('/people?x=1');
    expect(answer.status).toBe(307);
    expect(answer.headers.get('location')).toMatch(/\/sign-in\?next=%2Fpeople%3Fx%3D1$/);
  });

  test('are not there for whom they are not', async () => {
    const mechanic = await signedIn(marlo!.email);
    expect((await mechanic.fetch('/people')).status).toBe(404);
    expect((await manager.fetch('/people')).status).toBe(200);
    expect((await mechanic.fetch('/account')).status).toBe(200);
  });

  test('home is each role’s first screen', async () => {
    const dock = await signedIn((await addStaff(database.db, 'Dov', 'dock')).email);
    const mechanic = await signedIn(marlo!.email);
    const home = async (browser: Browser) => (await browser.fetch('/')).headers.get('location');
    expect(await home(manager)).toMatch(/\/availability$/);
    expect(await home(mechanic)).toMatch(/\/tasks$/);
    expect(await home(dock)).toMatch(/\/board$/);
  });

  test('let scripts run by their nonce alone, and nobody frame them', async () => {
    const answer = await visitor().fetch('/sign-in');
    const policy = answer.headers.get('content-security-policy') ?? '';
    const nonce = /script-src 'self' 'nonce-([^']+)' 'strict-dynamic'(?:;|$)/.exec(policy)?.[1];
    expect(nonce).toBeTruthy();
    expect(policy).toContain("frame-ancestors 'none'");
    const scripts = (await answer.text()).match(/<script\b[^>]*>/g) ?? [];
    expect(scripts.length).toBeGreaterThan(0);
    for (const script of scripts) expect(script).toContain(`nonce="${nonce}"`);
    expect(answer.headers.get('x-content-type-options')).toBe('nosniff');
    expect(answer.headers.get('referrer-policy')).toBe('same-origin');
    expect((await visitor().fetch('/sign-in')).headers.get('content-security-policy')).not.toBe(policy);
  });
});
