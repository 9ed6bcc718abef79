import { afterAll, beforeAll, expect, test } from 'vitest';
import { type Api, api } from '../support/api';
import { type App, startApp } from '../support/app';
import { addPerson } from '../support/crew';
import { testDatabase } from '../support/database';

const database = testDatabase({ keep: true });
let app: App;
let manager: Api;

beforeAll(async () => {
  app = await startApp({ databaseUrl: database.url, worker: false });
  manager = api(app.baseUrl, await addPerson(database.db, 'manager'));
});
afterAll(() => app.stop());

test('the built server works on the database it was given', async () => {
  const created = await manager.post<{ id: string }>('/docks', {
    name: 'Long Pier',
    timeZone: 'Europe/Lisbon',
  });
  expect(created.status).toBe(201);
  expect(await database.db.selectFrom('dock').select(['id', 'name']).execute()).toEqual([
    { id: created.body.id, name: 'Long Pier' },
  ]);
});

test('a caller without a sign-in is turned away and changes nothing', async () => {
  const refused = await api(app.baseUrl).post('/docks', { name: 'Short Pier', timeZone: 'Europe/Lisbon' });
  expect(refused.status).toBe(401);
  expect(refused.headers.get('content-type')).toContain('application/problem+json');
  const names = await database.db.selectFrom('dock').select('name').execute();
  expect(names).toEqual([{ name: 'Long Pier' }]);
});
