import { expect, test } from 'vitest';
import { testDatabase } from '../support/database';
import { testApi } from '../support/http';
import { untilSomebodyWaits } from '../support/waiting';

const database = testDatabase();
const api = testApi(database);

test('somebody who is renamed while they are given another role keeps that role', async () => {
  const manager = await api.caller('manager');
  const { personId } = await api.caller('mechanic');
  const role = await database.db.startTransaction().execute();
  await role.updateTable('person').set({ role: 'dock' }).where('id', '=', personId).execute();
  const renaming = manager.send('PATCH', `/people/${personId}`, { name: 'Bo Tarn' });
  await untilSomebodyWaits(database.db);
  await role.commit().execute();
  expect((await renaming).body).toMatchObject({ name: 'Bo Tarn', role: 'dock' });
});

test('links for a new password that are asked for at the same moment are three at most', async () => {
  const { personId } = await api.caller('mechanic');
  const { email } = await database.db
    .selectFrom('person')
    .select('email')
    .where('id', '=', personId)
    .executeTakeFirstOrThrow();
  const asked = await Promise.all(
    Array.from({ length: 8 }, () => api.nobody.send('POST', '/password-resets', { email })),
  );
  expect(asked.map(({ status }) => status)).toEqual(Array(8).fill(202));
  expect(await database.db.selectFrom('mail').select('id').execute()).toHaveLength(3);
});
