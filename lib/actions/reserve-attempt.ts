import {
  deleteOldAttempts,
  insertAttempt,
  listFailures,
  lockAttempts,
  type AttemptKeys,
} from '@/db/queries/sign-in-attempts';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import {
  ATTEMPT_MATTERS_MS,
  computeWaitMs,
  countedAddress,
  SIGN_IN_LADDERS,
} from '@/lib/domain/sign-in-limit';
import { Refusal } from '@/lib/errors';
import { privateKey } from '@/lib/secrets/private-key';

/** Whose password is tried, from where, and on which known device, if any. */
export type Attempt = { account: string; address: string; deviceId: string | null };

/**
 * Takes one attempt at a password, counted as wrong until `markAttemptSucceeded` says otherwise: so many sent at
 * once cannot slip past the count. Answers the attempt's id. Throws `too_many_attempts` with the time to wait, and
 * then counts nothing: hammering does not lengthen the wait. Only a hash of `account` is kept, for people type
 * passwords into the wrong field.
 */
export async function reserveAttempt(ctx: Context, attempt: Attempt): Promise<number> {
  const keys: AttemptKeys = {
    emailKey: privateKey(attempt.account),
    address: countedAddress(attempt.address),
    deviceId: attempt.deviceId,
  };
  const since = new Date(ctx.now.getTime() - ATTEMPT_MATTERS_MS);
  return runTransaction(ctx.db, async (trx) => {
    await lockAttempts(trx, keys);
    const failures = await listFailures(trx, keys, since);
    const waitMs = Math.max(
      computeWaitMs(SIGN_IN_LADDERS.account, failures.account, ctx.now),
      computeWaitMs(SIGN_IN_LADDERS.address, failures.address, ctx.now),
      computeWaitMs(SIGN_IN_LADDERS.device, failures.device, ctx.now),
    );
    if (waitMs > 0) throw tooMany(Math.ceil(waitMs / 1000));
    await deleteOldAttempts(trx, keys, since);
    return insertAttempt(trx, keys, ctx.now);
  });
}

function tooMany(seconds: number): Refusal {
  const wait =
    seconds < 120 ? `${seconds} second${seconds === 1 ? '' : 's'}` : `${Math.ceil(seconds / 60)} minutes`;
  return new Refusal('too_many_attempts', `Too many wrong attempts. Try again in ${wait}.`, [], seconds);
}
