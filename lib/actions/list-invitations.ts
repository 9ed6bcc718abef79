import { listOpenInvitations } from '@/db/queries/invitations';
import type { Context } from '@/lib/context';
import type { Invitation } from '@/lib/schemas/invitation';
import { requireFleetWide } from './access';
import { toInvitation } from './shape-invitation';

/** The invitations that nobody accepted or withdrew, expired ones too. Managers of all docks only. */
export async function listInvitations(ctx: Context): Promise<Invitation[]> {
  requireFleetWide(ctx, 'person.read');
  return (await listOpenInvitations(ctx.db)).map(toInvitation);
}
