import { randomUUID } from 'node:crypto';
import { expect, test } from 'vitest';
import { sendPasswordReset } from '@/lib/actions/send-password-reset';
import { asSystem } from '../support/crew';
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

test('letters for a new password that are written at the same moment are three at most', async () => {
  const { personId } = await api.caller('mechanic');
  const { email } = await database.db
    .selectFrom('person')
    .select('email')
    .where('id', '=', personId)
    .executeTakeFirstOrThrow();
  const ctx = asSystem(database.db, new Date());
  await Promise.all(Array.from({ length: 8 }, () => sendPasswordReset(ctx, { id: randomUUID(), email })));
  expect(await database.db.selectFrom('mail').select('id').execute()).toHaveLength(3);
});
