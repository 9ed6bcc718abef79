import { sql } from 'kysely';
import { beforeEach, expect, test } from 'vitest';
import { askPasswordReset } from '@/lib/actions/ask-password-reset';
import { changePassword } from '@/lib/actions/change-password';
import { signIn } from '@/lib/actions/sign-in';
import { findPasswordReset } from '@/lib/actions/find-password-reset';
import { asSystem } from '../support/crew';
import { testDatabase } from '../support/database';
import { addStaff, PASSWORD, sendAskedResets, tokenInLetter } from '../support/people';
import { setEnvironment } from '../support/worker';

const database = testDatabase();
const now = new Date('2026-06-02T12:00:00Z');
const ctx = () => asSystem(database.db, now);
const ask = (email: string, address = '203.0.113.1') => askPasswordReset(ctx(), { email, address });
const outcomes = async (attempts: readonly (() => Promise<void>)[]) => {
  const said: string[] = [];
  for (const attempt of attempts)
    said.push(
      await attempt().then(
        () => 'taken',
        (refusal: { code: string }) => refusal.code,
      ),
    );
  return said;
};
let ada: Awaited<ReturnType<typeof addStaff>>;

beforeEach(async () => {
  setEnvironment(database.url);
  ada = await addStaff(database.db, 'Ada', 'manager');
});

test('a link for a new password that was asked for before works no more once the password is changed', async () => {
  await ask(ada.email);
  await sendAskedResets(database.db, now);
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

test('asking for a link is the same work whether or not anybody has the address', async () => {
  const done: unknown[] = [];
  for (const email of [ada.email, 'nobody@wakewright.example']) {
    await ask(email);
    const { rows } = await sql`
      select (select count(*) from mail) as letters, (select count(*) from password_reset) as links,
             (select count(*) from sign_in_attempt) as attempts,
             (select count(*) from graphile_worker._private_jobs) as jobs`.execute(database.db);
    await sql`delete from sign_in_attempt`.execute(database.db);
    await sql`delete from graphile_worker._private_jobs`.execute(database.db);
    done.push(...rows);
  }
  expect(done[0]).toEqual({ letters: 0, links: 0, attempts: 1, jobs: 1 });
  expect(done[1]).toEqual(done[0]);
});

// As at a sign-in (`lib/domain/sign-in-limit.ts`): five cost no wait for one account, thirty for one network address.
test.each(['ada@wakewright.example', 'nobody@wakewright.example'])(
  'the sixth link asked for %s has to wait, from wherever it is asked',
  async (email) => {
    const attempts = Array.from({ length: 6 }, (_, n) => () => ask(email, `203.0.113.${n}`));
    expect(await outcomes(attempts)).toEqual([...Array(5).fill('taken'), 'too_many_attempts']);
  },
);

test('the thirty-first link asked for from one network has to wait; who asks there can still sign in', async () => {
  const attempts = Array.from({ length: 31 }, (_, n) => () => ask(`guest-${n}@wakewright.example`));
  const said = await outcomes(attempts);
  expect(said.indexOf('too_many_attempts')).toBe(30);
  const input = { email: ada.email, password: PASSWORD, address: '203.0.113.1', deviceToken: null };
  expect(await signIn(ctx(), input)).toMatchObject({ personId: ada.id });
});
