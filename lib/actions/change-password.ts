import { usePasswordResetsUp } from '@/db/queries/password-resets';
import { changePerson, findCredential } from '@/db/queries/people';
import { renewSession } from '@/db/queries/sessions';
import { markAttemptSucceeded } from '@/db/queries/sign-in-attempts';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { refuseField } from '@/lib/errors';
import type { ChangePassword } from '@/lib/schemas/account';
import { checkNewPassword } from './check-new-password';
import { ownSelf } from './own-self';
import { hashPassword, verifyPassword } from '@/lib/secrets/password-hash';
import { reserveAttempt } from './reserve-attempt';
import { tellPasswordChanged } from './tell-password-changed';

/**
 * Changes one's own password; every other session ends and every link for a new one works no more. Guesses at the
 * present one are counted as those of a sign-in are, for this person alone. Throws `invalid_input` on
 * `currentPassword` or `newPassword`, `forbidden` for an API key, `too_many_attempts`.
 */
export async function changePassword(
  ctx: Context,
  input: ChangePassword & { address: string },
): Promise<void> {
  const self = ownSelf(ctx, { signedIn: true });
  checkNewPassword(input.newPassword, self.email, 'newPassword');
  const account = `own password of ${self.personId}`;
  const attemptId = await reserveAttempt(ctx, { account, address: input.address, deviceId: null });
  const credential = await findCredential(ctx.db, self.personId);
  if (!(await verifyPassword(credential?.password_hash ?? null, input.currentPassword))) {
    throw refuseField('currentPassword', 'is not your present password');
  }
  const passwordHash = await hashPassword(input.newPassword);
  await runTransaction(ctx.db, async (trx) => {
    await markAttemptSucceeded(trx, attemptId);
    await usePasswordResetsUp(trx, self.personId, ctx.now);
    const changed = await changePerson(
      trx,
      self.personId,
      { password_hash: passwordHash },
      { endSessions: true },
    );
    if (self.sessionId) await renewSession(trx, self.sessionId, changed.session_version);
    await tellPasswordChanged({ ...ctx, db: trx }, self.email);
  });
}
