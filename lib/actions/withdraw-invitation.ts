import { withdrawInvitation as withdrawInvitationRow } from '@/db/queries/invitations';
import type { Context } from '@/lib/context';
import { refuseField } from '@/lib/errors';
import { requireFleetWide } from './access';

/** Takes an open invitation back: its link works no more. Managers of all docks only. Throws `not_found` on `id`. */
export async function withdrawInvitation(ctx: Context, { id }: { id: string }): Promise<void> {
  requireFleetWide(ctx, 'person.write');
  if (!(await withdrawInvitationRow(ctx.db, id, ctx.now))) {
    throw refuseField('id', 'is no open invitation', 'not_found');
  }
}
