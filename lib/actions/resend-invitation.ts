import { renewInvitation } from '@/db/queries/invitations';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { refuseField } from '@/lib/errors';
import type { Invitation } from '@/lib/schemas/invitation';
import { requireFleetWide } from './access';
import { INVITATION_MS } from './invite-person';
import { makeToken } from '@/lib/secrets/one-time-token';
import { sendInvitation } from './send-invitation';
import { toInvitation } from './shape-invitation';

/**
 * Sends an open invitation again, with a new link for another seven days; the old link works no more. Managers of
 * all docks only. Throws `not_found` on `id`.
 */
export async function resendInvitation(ctx: Context, { id }: { id: string }): Promise<Invitation> {
  requireFleetWide(ctx, 'person.write');
  const { token, hash } = makeToken();
  return runTransaction(ctx.db, async (trx) => {
    const row = await renewInvitation(trx, id, {
      token_hash: hash,
      expires_at: new Date(ctx.now.getTime() + INVITATION_MS),
    });
    if (!row) throw refuseField('id', 'is no open invitation', 'not_found');
    await sendInvitation({ ...ctx, db: trx }, row, token);
    return toInvitation(row);
  });
}
