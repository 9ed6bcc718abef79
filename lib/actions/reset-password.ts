import { expireKnownDevices } from '@/db/queries/known-devices';
import { findPersonByResetToken, takePasswordReset, usePasswordResetsUp } from '@/db/queries/password-resets';
import { changePerson } from '@/db/queries/people';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { refuseField, type Refusal } from '@/lib/errors';
import type { ResetPassword } from '@/lib/schemas/password-reset';
import { checkNewPassword } from './check-new-password';
import { hashToken } from '@/lib/secrets/one-time-token';
import { hashPassword } from '@/lib/secrets/password-hash';
import { tellPasswordChanged } from './tell-password-changed';

/**
 * Sets a new password for whoever holds the link, once; every session ends, every known device is forgotten and
 * every other link is worth nothing. Throws `not_found` on `token` when it works no more, `invalid_input` on
 * `password`.
 */
export async function resetPassword(ctx: Context, input: ResetPassword): Promise<void> {
  const tokenHash = hashToken(input.token);
  const person = await findPersonByResetToken(ctx.db, tokenHash, ctx.now);
  if (!person) throw gone();
  checkNewPassword(input.password, person.email);
  const passwordHash = await hashPassword(input.password);
  await runTransaction(ctx.db, async (trx) => {
    if (!(await takePasswordReset(trx, tokenHash, ctx.now))) throw gone();
    await usePasswordResetsUp(trx, person.id, ctx.now);
    await expireKnownDevices(trx, person.id, ctx.now);
    await changePerson(trx, person.id, { password_hash: passwordHash }, { endSessions: true });
    await tellPasswordChanged({ ...ctx, db: trx }, person.email);
  });
}

function gone(): Refusal {
  return refuseField('token', 'This link works no more. Ask for a new one.', 'not_found');
}
