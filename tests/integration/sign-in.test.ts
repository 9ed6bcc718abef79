import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import type { Person } from '@/lib/schemas/person';
import { startApp, type App } from '../support/app';
import { openBrowser, sendFrom, type Browser } from '../support/browser';
import { testDatabase } from '../support/database';
import { addStaff, PASSWORD } from '../support/people';

const database = testDatabase();
let app: App;
let [ada, marlo]: Person[] = [];

beforeAll(async () => {
  // One proxy in front, so that a test can say where each browser is.
  app = await startApp({ databaseUrl: database.url, worker: false, env: { TRUST_PROXY: '1' } });
}, 300_000);
afterAll(() => app.stop());
beforeEach(async () => {
  ada = await addStaff(database.db, 'Ada', 'manager');
  marlo = await addStaff(database.db, 'Marlo', 'mechanic');
});

const at = (address: string) => openBrowser(app.baseUrl, { address });
const HOME = '198.51.100.10';
const ELSEWHERE = '203.0.113.66';

async function refusalOf(response: Response) {
  const { url: _, ...problem } = (await response.json()) as Record<string, unknown>;
  return problem;
}

async function signedIn(email: string, address = HOME): Promise<Browser> {
  const browser = at(address);
  expect((await browser.signIn(email, PASSWORD)).status).toBe(200);
  return browser;
}

/** Tries wrong passwords one after the other and answers the statuses. */
async function guess(browser: Browser, email: string, times: number): Promise<number[]> {
  const statuses: number[] = [];
  for (let n = 0; n < times; n += 1) {
    statuses.push((await browser.signIn(email, `wrong guess number ${n}`)).status);
  }
  return statuses;
}

describe('signing in', () => {
  test('with the right password one is in, in whatever case the address is written', async () => {
    const browser = at(HOME);
    expect(await browser.isSignedIn()).toBe(false);
    expect((await browser.signIn('  ADA@wakewright.example', PASSWORD)).status).toBe(200);
    const { body } = await sendFrom(browser, 'GET', '/account');
    expect(body).toMatchObject({ id: ada!.id, name: 'Ada', role: 'manager', dockIds: [] });
  });

  test('the cookies cannot be read by scripts and name nobody', async () => {
    const browser = await signedIn(ada!.email);
    const answer = await at(HOME).signIn(ada!.email, PASSWORD);
    const kept = answer.headers.getSetCookie().filter((cookie) => /session-token|known-device/.test(cookie));
    expect(kept).toHaveLength(2);
    for (const cookie of kept) expect(cookie).toMatch(/HttpOnly.*SameSite=Lax|SameSite=Lax.*HttpOnly/i);
    expect([...browser.jar.values()].join()).not.toMatch(/ada|manager/i);
  });

  test('a wrong password, an unknown address and a deactivated person are told the same', async () => {
    const manager = await signedIn(ada!.email);
    await sendFrom(manager, 'POST', `/people/${marlo!.id}/deactivation`);
    const wrong = await at(HOME).signIn(ada!.email, 'not the password at all');
    const unknown = await at(HOME).signIn('nobody@wakewright.example', PASSWORD);
    const deactivated = await at(HOME).signIn(marlo!.email, PASSWORD);
    expect(wrong.status).toBe(401);
    expect(unknown.status).toBe(401);
    expect(deactivated.status).toBe(401);
    const told = await refusalOf(wrong);
    expect(told).toMatchObject({ code: 'not_signed_in', errors: [] });
    expect(await refusalOf(unknown)).toEqual(told);
    expect(await refusalOf(deactivated)).toEqual(told);
  });

  test.each([
    ['email', { email: 'no address', password: PASSWORD }],
    ['password', { email: 'ada@wakewright.example', password: '' }],
  ])('a bad %s is named', async (path, { email, password }) => {
    const answer = await at(HOME).signIn(email, password);
    expect(answer.status).toBe(422);
    expect(await answer.json()).toMatchObject({ code: 'invalid_input', errors: [{ path }] });
  });

  test('a session of the next-auth page names the person and nothing else', async () => {
    const browser = await signedIn(ada!.email);
    const session = (await (await browser.fetch('/api/auth/session')).json()) as { user: object };
    expect(session.user).toEqual({ id: ada!.id, name: 'Ada', email: ada!.email, role: 'manager' });
    expect(await browser.isSignedIn()).toBe(true);
  });

  test('signing out ends the session, also for a copy of its cookie', async () => {
    const browser = await signedIn(ada!.email);
    const copy = at(HOME);
    for (const [name, value] of browser.jar) copy.jar.set(name, value);
    expect(await copy.isSignedIn()).toBe(true);
    expect((await browser.signOut()).status).toBe(200);
    expect(await browser.isSignedIn()).toBe(false);
    expect(await copy.isSignedIn()).toBe(false);
  });

  test('a sign-in without next-auth’s token changes nothing', async () => {
    const browser = at(HOME);
    const form = new URLSearchParams({ email: ada!.email, password: PASSWORD, json: 'true' });
    await browser.fetch('/api/auth/callback/credentials', { method: 'POST', body: form });
    expect(await browser.isSignedIn()).toBe(false);
  });
});

describe('guessing', () => {
  test('after five wrong passwords the account has to wait, and is told how long', async () => {
    const thief = at(ELSEWHERE);
    expect(await guess(thief, ada!.email, 5)).toEqual([401, 401, 401, 401, 401]);
    const sixth = await thief.signIn(ada!.email, PASSWORD);
    expect(sixth.status).toBe(429);
    expect(Number(sixth.headers.get('retry-after'))).toBeGreaterThan(50);
    expect(Number(sixth.headers.get('retry-after'))).toBeLessThanOrEqual(60);
    expect(await refusalOf(sixth)).toMatchObject({ code: 'too_many_attempts' });
    expect(await thief.isSignedIn()).toBe(false);
  });

  test('an address nobody has is limited just the same', async () => {
    expect(await guess(at(ELSEWHERE), 'nobody@wakewright.example', 6)).toEqual([
      401, 401, 401, 401, 401, 429,
    ]);
  });

  test('the owner is not locked out on a known device, and is on one never seen', async () => {
    const own = await signedIn(ada!.email);
    await own.signOut();
    await guess(at(ELSEWHERE), ada!.email, 6);
    expect((await at('198.51.100.99').signIn(ada!.email, PASSWORD)).status).toBe(429);
    expect((await own.signIn(ada!.email, PASSWORD)).status).toBe(200);
  });

  test('a known device is known for its own people alone, and has a limit of its own', async () => {
    const shared = await signedIn(ada!.email);
    expect(await guess(shared, marlo!.email, 6)).toEqual([401, 401, 401, 401, 401, 429]);
    expect(await guess(shared, ada!.email, 6)).toEqual([401, 401, 401, 401, 401, 429]);
    expect((await at(ELSEWHERE).signIn(ada!.email, PASSWORD)).status).toBe(200);
  });

  test('one address that tries many accounts has to wait, others do not', async () => {
    const thief = at(ELSEWHERE);
    for (let n = 0; n < 30; n += 1) await guess(thief, `person${n}@wakewright.example`, 1);
    expect((await thief.signIn(ada!.email, PASSWORD)).status).toBe(429);
    expect((await at(HOME).signIn(ada!.email, PASSWORD)).status).toBe(200);
  });

  test('of twenty guesses sent at once five are looked at', async () => {
    const answers = await Promise.all(
      Array.from({ length: 20 }, (_, n) => at(`203.0.113.${n}`).signIn(ada!.email, `guess ${n} of many`)),
    );
    expect(answers.map((answer) => answer.status).sort()).toEqual([
      ...Array<number>(5).fill(401),
      ...Array<number>(15).fill(429),
    ]);
  });

  test('what was typed as an address is not kept in the clear', async () => {
    await guess(at(HOME), 'six.knots.at@slack-water.example', 1);
    const rows = await database.db.selectFrom('sign_in_attempt').selectAll().execute();
    expect(rows).toHaveLength(1);
    expect(JSON.stringify(rows)).not.toContain('slack-water');
  });
});

describe('access at the next request', () => {
  test('a deactivated person has none, by cookie or by key, until reactivated', async () => {
    const manager = await signedIn(ada!.email);
    const other = await addStaff(database.db, 'Bea', 'manager');
    const browser = await signedIn(other.email);
    const { body: key } = await sendFrom(browser, 'POST', '/api-keys', { name: 'Till' });
    const byKey = () =>
      fetch(`${app.baseUrl}/api/v1/account`, { headers: { authorization: `Bearer ${String(key.key)}` } });
    expect((await byKey()).status).toBe(200);
    expect((await sendFrom(manager, 'POST', `/people/${other.id}/deactivation`)).status).toBe(200);
    expect(await browser.isSignedIn()).toBe(false);
    expect((await byKey()).status).toBe(401);
    expect((await sendFrom(manager, 'DELETE', `/people/${other.id}/deactivation`)).status).toBe(200);
    expect(await browser.isSignedIn()).toBe(false);
    expect((await browser.signIn(other.email, PASSWORD)).status).toBe(200);
  });

  test('a demoted manager is signed out, and is a mechanic from then on', async () => {
    const manager = await signedIn(ada!.email);
    const other = await addStaff(database.db, 'Bea', 'manager');
    const browser = await signedIn(other.email);
    expect((await sendFrom(browser, 'GET', '/people')).status).toBe(200);
    await sendFrom(manager, 'PATCH', `/people/${other.id}`, { role: 'mechanic' });
    expect((await sendFrom(browser, 'GET', '/people')).status).toBe(401);
    await browser.signIn(other.email, PASSWORD);
    expect((await sendFrom(browser, 'GET', '/people')).status).toBe(403);
  });

  test('a session that expired, or a cookie that was changed, opens nothing', async () => {
    const browser = await signedIn(ada!.email);
    const name = [...browser.jar.keys()].find((each) => each.includes('session-token'))!;
    const forged = at(HOME);
    forged.jar.set(
      name,
      browser.jar.get(name)!.replace(/.$/, (last) => (last === 'A' ? 'E' : 'A')),
    );
    expect(await forged.isSignedIn()).toBe(false);
    await database.db.updateTable('session').set({ expires_at: new Date() }).execute();
    expect(await browser.isSignedIn()).toBe(false);
  });
});

describe('another site', () => {
  test.each<Record<string, string>>([
    { origin: 'https://elsewhere.example' },
    { 'sec-fetch-site': 'cross-site' },
  ])('cannot write with the person’s cookie: %j', async (headers) => {
    const browser = await signedIn(ada!.email);
    const answer = await browser.fetch('/api/v1/account', {
      method: 'PATCH',
      headers: { 'content-type': 'application/json', ...headers },
      body: JSON.stringify({ name: 'Taken over' }),
    });
    expect(answer.status).toBe(403);
    expect(await answer.json()).toMatchObject({ code: 'cross_site' });
    expect((await sendFrom(browser, 'GET', '/account')).body.name).toBe('Ada');
  });
});
