import { createHash } from 'node:crypto';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type Api, api } from '../support/api';
import { type App, startApp } from '../support/app';
import { testDatabase } from '../support/database';

const database = testDatabase({ keep: true });
let app: App;
let manager: Api;

beforeAll(async () => {
  app = await startApp({ databaseUrl: database.url, worker: false });
  manager = api(app.baseUrl, await managersKey());
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

/** An API key of a manager, written down as its hash as the product does. */
async function managersKey(): Promise<{ key: string }> {
  const key = 'a-key-that-only-this-test-has';
  const { id } = await database.db
    .insertInto('person')
    .values({ email: 'manager@pier.example', name: 'A manager', role: 'manager' })
    .returning('id')
    .executeTakeFirstOrThrow();
  const key_hash = createHash('sha256').update(key).digest();
  await database.db
    .insertInto('api_key')
    .values({ person_id: id, name: 'test', prefix: 'a key', key_hash })
    .execute();
  return { key };
}
