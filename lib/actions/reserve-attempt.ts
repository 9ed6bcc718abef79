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

/** Whose password is tried, from where, and on which known device, if any; or whose is asked for anew. */
export type Attempt = {
  account: string;
  address: string;
  deviceId: string | null;
  at?: keyof typeof COUNTERS;
};

/** Each counts the attempts from an address by itself: letters that somebody asks for keep nobody from signing in. */
const COUNTERS = {
  password: { prefix: '', refused: 'Too many wrong attempts.' },
  reset: { prefix: 'reset ', refused: 'Too many links were asked for.' },
} as const;

/**
 * Takes one attempt at a password, or one asking for a new one, counted as wrong until `markAttemptSucceeded` says otherwise: so many sent at
 * once cannot slip past the count. Answers the attempt's id. Throws `too_many_attempts` with the time to wait, and
 * then counts nothing: hammering does not lengthen the wait. Only a hash of `account` is kept, for people type
 * passwords into the wrong field.
 */
export async function reserveAttempt(ctx: Context, attempt: Attempt): Promise<number> {
  const counter = COUNTERS[attempt.at ?? 'password'];
  const keys: AttemptKeys = {
    emailKey: privateKey(attempt.account),
    address: counter.prefix + countedAddress(attempt.address),
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
    if (waitMs > 0) throw tooMany(counter.refused, Math.ceil(waitMs / 1000));
    await deleteOldAttempts(trx, keys, since);
    return insertAttempt(trx, keys, ctx.now);
  });
}

function tooMany(refused: string, seconds: number): Refusal {
  const wait =
    seconds < 120 ? `${seconds} second${seconds === 1 ? '' : 's'}` : `${Math.ceil(seconds / 60)} minutes`;
  return new Refusal('too_many_attempts', `${refused} Try again in ${wait}.`, [], seconds);
}
