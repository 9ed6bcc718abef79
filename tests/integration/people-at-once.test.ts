import { sql } from 'kysely';
import { expect, test } from 'vitest';
import { testDatabase } from '../support/database';
import { testApi } from '../support/http';

const database = testDatabase();
const api = testApi(database);

async function untilSomebodyWaits(): Promise<void> {
  const waiting = sql`select 1 from pg_stat_activity
    where datname = current_database() and wait_event_type = 'Lock'`;
  while ((await waiting.execute(database.db)).rows.length === 0);
}

test('somebody who is renamed while they are given another role keeps that role', async () => {
  const manager = await api.caller('manager');
  const { personId } = await api.caller('mechanic');
  const role = await database.db.startTransaction().execute();
  await role.updateTable('person').set({ role: 'dock' }).where('id', '=', personId).execute();
  const renaming = manager.send('PATCH', `/people/${personId}`, { name: 'Bo Tarn' });
  await untilSomebodyWaits();
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
