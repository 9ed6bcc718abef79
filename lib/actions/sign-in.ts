import { findKnownDevice, upsertKnownDevice } from '@/db/queries/known-devices';
import { findCredentialByEmail } from '@/db/queries/people';
import { insertSession } from '@/db/queries/sessions';
import { markAttemptSucceeded } from '@/db/queries/sign-in-attempts';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { Refusal } from '@/lib/errors';
import { hashToken, makeToken } from '@/lib/secrets/one-time-token';
import { verifyPassword } from '@/lib/secrets/password-hash';
import { reserveAttempt } from './reserve-attempt';

const DAY_MS = 86_400_000;
/** A session ends this long after sign-in, used or not. */
export const SESSION_MS = 14 * DAY_MS;
/** A device is known this long after its last sign-in. */
export const DEVICE_MS = 180 * DAY_MS;

const NOBODY = '00000000-0000-0000-0000-000000000000';

export type SignInInput = { email: string; password: string; address: string; deviceToken: string | null };
export type SignedIn = { personId: string; sessionId: string; expiresAt: Date; deviceToken: string };

/**
 * Begins a session. An unknown address, a wrong password and a deactivated person are refused alike, by the same
 * steps and in the same time: `not_signed_in`. Throws `too_many_attempts` with the time to wait.
 * `deviceToken` is kept by the browser: the device is known from then on.
 */
export async function signIn(ctx: Context, input: SignInInput): Promise<SignedIn> {
  const deviceToken = input.deviceToken ?? makeToken().token;
  const person = await findCredentialByEmail(ctx.db, input.email);
  const deviceHash = hashDevice(deviceToken, person?.id ?? NOBODY);
  const deviceId = (await findKnownDevice(ctx.db, deviceHash, ctx.now)) ?? null;
  const attemptId = await reserveAttempt(ctx, { account: input.email, address: input.address, deviceId });
  const matches = await verifyPassword(person?.password_hash ?? null, input.password);
  if (!matches || !person || person.deactivated_at) {
    throw new Refusal('not_signed_in', 'The e-mail address or the password is not right.');
  }
  const expiresAt = new Date(ctx.now.getTime() + SESSION_MS);
  const sessionId = await runTransaction(ctx.db, async (trx) => {
    await markAttemptSucceeded(trx, attemptId);
    await upsertKnownDevice(trx, {
      personId: person.id,
      tokenHash: deviceHash,
      now: ctx.now,
      expiresAt: new Date(ctx.now.getTime() + DEVICE_MS),
    });
    const version = person.session_version;
    return insertSession(trx, { personId: person.id, version, now: ctx.now, expiresAt });
  });
  return { personId: person.id, sessionId, expiresAt, deviceToken };
}

/** One browser carries one token, but is known for each person who signed in on it by themselves. */
function hashDevice(deviceToken: string, personId: string): Buffer {
  return hashToken(`${deviceToken}:${personId}`);
}
