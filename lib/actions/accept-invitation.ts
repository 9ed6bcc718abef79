import { findInvitationByToken, takeInvitation } from '@/db/queries/invitations';
import { insertPerson } from '@/db/queries/people';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { refuseField, type Refusal } from '@/lib/errors';
import type { AcceptInvitation } from '@/lib/schemas/invitation';
import type { Person } from '@/lib/schemas/person';
import { checkNewPassword } from './check-new-password';
import { hashToken } from '@/lib/secrets/one-time-token';
import { hashPassword } from '@/lib/secrets/password-hash';
import { refusingTaken } from './refusing-taken';
import { toPerson } from './shape-person';

/**
 * Makes the invited person, with the password they chose. Whoever holds the link may call it, once. Throws
 * `not_found` on `token` when it works no more, `invalid_input` on `password`, `conflict` on `token` when somebody
 * has the e-mail address by now.
 */
export async function acceptInvitation(ctx: Context, input: AcceptInvitation): Promise<Person> {
  const tokenHash = hashToken(input.token);
  const invitation = await findInvitationByToken(ctx.db, tokenHash, ctx.now);
  if (!invitation) throw gone();
  checkNewPassword(input.password, invitation.email);
  const passwordHash = await hashPassword(input.password);
  return runTransaction(ctx.db, async (trx) => {
    const taken = await takeInvitation(trx, tokenHash, ctx.now);
    if (!taken) throw gone();
    const row = await refusingTaken(
      { person_email: ['token', 'Somebody has this e-mail address already.'] },
      () =>
        insertPerson(trx, {
          name: input.name ?? taken.name,
          email: taken.email,
          role: taken.role,
          dock_ids: taken.dock_ids,
          password_hash: passwordHash,
          digest_wanted: taken.role === 'manager',
          created_at: ctx.now,
        }),
    );
    return toPerson(row);
  });
}

function gone(): Refusal {
  return refuseField('token', 'This invitation works no more. Ask a manager to send it again.', 'not_found');
}
