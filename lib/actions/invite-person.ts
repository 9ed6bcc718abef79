import { insertInvitation } from '@/db/queries/invitations';
import { findCredentialByEmail } from '@/db/queries/people';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { Refusal, refuseField } from '@/lib/errors';
import type { CreateInvitation, Invitation } from '@/lib/schemas/invitation';
import { requireFleetWide } from './access';
import { checkDocks } from './check-docks';
import { makeToken } from '@/lib/secrets/one-time-token';
import { refusingTaken } from './refusing-taken';
import { sendInvitation } from './send-invitation';
import { toInvitation } from './shape-invitation';

/** How long the link of an invitation works. */
export const INVITATION_MS = 7 * 86_400_000;

/**
 * Invites somebody by e-mail to be of this role at these docks. Managers of all docks only. The letter is queued
 * with the invitation. Throws `conflict` on `email` when they are here or invited already, `not_found` on a dock.
 */
export async function invitePerson(ctx: Context, input: CreateInvitation): Promise<Invitation> {
  requireFleetWide(ctx, 'person.write');
  if (ctx.actor.kind !== 'person') throw new Refusal('forbidden', 'An invitation comes from a person.');
  const { personId } = ctx.actor;
  const dockIds = [...new Set(input.dockIds ?? [])];
  await checkDocks(ctx, dockIds);
  if (await findCredentialByEmail(ctx.db, input.email)) {
    throw refuseField('email', 'Somebody has this e-mail address already.', 'conflict');
  }
  const { token, hash } = makeToken();
  return runTransaction(ctx.db, async (trx) => {
    const row = await refusingTaken(
      {
        invitation_open: [
          'email',
          'There is an open invitation to this address. Send it again or withdraw it.',
        ],
      },
      () =>
        insertInvitation(trx, {
          email: input.email,
          name: input.name,
          role: input.role,
          dock_ids: dockIds,
          token_hash: hash,
          invited_by: personId,
          invited_at: ctx.now,
          expires_at: new Date(ctx.now.getTime() + INVITATION_MS),
        }),
    );
    await sendInvitation({ ...ctx, db: trx }, row, token);
    return toInvitation(row);
  });
}
