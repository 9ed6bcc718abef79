import { beforeEach, expect, test } from 'vitest';
import { askPasswordReset } from '@/lib/actions/ask-password-reset';
import { changePassword } from '@/lib/actions/change-password';
import { findPasswordReset } from '@/lib/actions/find-password-reset';
import { asSystem } from '../support/crew';
import { testDatabase } from '../support/database';
import { addStaff, PASSWORD, tokenInLetter } from '../support/people';
import { setEnvironment } from '../support/worker';

const database = testDatabase();
const now = new Date('2026-06-02T12:00:00Z');
const ctx = () => asSystem(database.db, now);
let ada: Awaited<ReturnType<typeof addStaff>>;

beforeEach(async () => {
  setEnvironment(database.url);
  ada = await addStaff(database.db, 'Ada', 'manager');
});

test('a link for a new password that was asked for before works no more once the password is changed', async () => {
  await askPasswordReset(ctx(), { email: ada.email });
  const token = await tokenInLetter(database.db, 'password-reset', ada.email);
  expect(await findPasswordReset(ctx(), { token })).toEqual({ email: ada.email });
  const actor = { kind: 'person' as const, personId: ada.id, sessionId: null, ...ada };
  const sessionId = (
    await database.db
      .insertInto('session')
      .values({ person_id: ada.id, session_version: 1, expires_at: now })
      .returning('id')
      .executeTakeFirstOrThrow()
  ).id;
  await changePassword(
    { ...ctx(), actor: { ...actor, sessionId } },
    { currentPassword: PASSWORD, newPassword: 'seven knots on the ebb', address: '203.0.113.1' },
  );
  expect(await findPasswordReset(ctx(), { token })).toBeNull();
});
