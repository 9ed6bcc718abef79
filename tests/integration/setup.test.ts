import { afterAll, beforeAll, expect, test } from 'vitest';
import { startApp, type App } from '../support/app';
import { openBrowser, sendFrom } from '../support/browser';
import { testDatabase } from '../support/database';
import { addStaff, PASSWORD } from '../support/people';

const database = testDatabase();
const TOKEN = 'printed-at-start-for-this-test';
let app: App;

beforeAll(async () => {
  app = await startApp({ databaseUrl: database.url, worker: false, env: { SETUP_TOKEN: TOKEN } });
}, 300_000);
afterAll(() => app.stop());

const FORM = {
  token: TOKEN,
  operatorName: 'Estuary Hire',
  dock: { name: 'Ferry steps', timeZone: 'Europe/Lisbon', season: { from: '04-01', to: '10-31' } },
  manager: { name: 'Ada Fairlead', email: 'ada@wakewright.example', password: PASSWORD },
};
const visitor = () => openBrowser(app.baseUrl);
const setUp = (change: object = {}) => sendFrom(visitor(), 'POST', '/setup', { ...FORM, ...change });
const location = async (path: string) => (await visitor().fetch(path)).headers.get('location');

/** What a refused set-up must not have left. */
async function expectNothing(): Promise<void> {
  for (const table of ['operator', 'dock', 'person'] as const) {
    expect(await database.db.selectFrom(table).select('id').execute(), table).toEqual([]);
  }
}

test('an empty server sends its first visitor to the form, and nobody after', async () => {
  expect(await location('/')).toMatch(/\/setup$/);
  expect(await location('/sign-in')).toMatch(/\/setup$/);
  expect((await visitor().fetch('/setup')).status).toBe(200);
  expect((await setUp()).status).toBe(201);
  expect(await location('/')).toMatch(/\/sign-in$/);
  expect(await location('/setup')).toMatch(/\/sign-in$/);
});

test('the form makes the operator, the dock and a manager of all docks who can sign in', async () => {
  const { body } = await setUp();
  expect(body).toMatchObject({
    operatorName: 'Estuary Hire',
    dock: { name: 'Ferry steps', timeZone: 'Europe/Lisbon', season: { from: '04-01', to: '10-31' } },
    manager: { name: 'Ada Fairlead', role: 'manager', dockIds: [] },
  });
  const ada = visitor();
  expect((await ada.signIn(FORM.manager.email, PASSWORD)).status).toBe(200);
  expect(await sendFrom(ada, 'GET', '/docks')).toMatchObject({
    status: 200,
    body: { items: [{ name: 'Ferry steps' }] },
  });
});

test.each(['', 'printed-at-start-for-this-tesT', 'x'.repeat(100)])(
  'without the token printed at start nothing happens: "%s"',
  async (token) => {
    const { status, body } = await setUp({ token });
    expect(status).toBeGreaterThanOrEqual(400);
    expect(body).toMatchObject({ errors: [{ path: 'token' }] });
    await expectNothing();
  },
);

test('of two at the same time one wins', async () => {
  const other = { name: 'Bea', email: 'bea@wakewright.example', password: PASSWORD };
  const answers = await Promise.all([setUp(), setUp({ manager: other })]);
  expect(answers.map(({ status }) => status).sort()).toEqual([201, 409]);
  expect(answers.find(({ status }) => status === 409)?.body).toMatchObject({ code: 'already_set_up' });
  expect(await database.db.selectFrom('person').select('id').execute()).toHaveLength(1);
  expect(await database.db.selectFrom('dock').select('id').execute()).toHaveLength(1);
});

test('a second time is refused', async () => {
  await setUp();
  expect((await setUp()).body).toMatchObject({ code: 'already_set_up' });
});

test.each([
  ['operatorName', { operatorName: '' }],
  ['dock.timeZone', { dock: { name: 'Ferry steps', timeZone: 'Atlantis/Centre' } }],
  ['dock.season.from', { dock: { ...FORM.dock, season: { from: '02-30', to: '10-31' } } }],
  ['manager.email', { manager: { ...FORM.manager, email: 'ada' } }],
  ['manager.password', { manager: { ...FORM.manager, password: 'short' } }],
  ['manager.password', { manager: { ...FORM.manager, password: 'passwordpassword' } }],
])('a bad %s is named and nothing is made', async (path, wrong) => {
  const { status, body } = await setUp(wrong);
  expect(status).toBe(422);
  expect(body).toMatchObject({ code: 'invalid_input', errors: [{ path }] });
  await expectNothing();
});

test('without a proxy in front, nobody can say they sign in from elsewhere', async () => {
  const ada = await addStaff(database.db, 'Ada', 'manager');
  await openBrowser(app.baseUrl, { address: '203.0.113.66' }).signIn(ada.email, 'not the password');
  const tried = await database.db.selectFrom('sign_in_attempt').select('address').execute();
  expect(tried).toEqual([{ address: '127.0.0.1' }]);
});
