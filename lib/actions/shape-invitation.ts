import type { InvitationRow } from '@/db/queries/invitations';
import type { Invitation } from '@/lib/schemas/invitation';

/** An invitation as the API and the screens show it: never its token. */
export function toInvitation(row: InvitationRow): Invitation {
  return {
    id: row.id,
    name: row.name,
    email: row.email,
    role: row.role,
    dockIds: row.dock_ids,
    invitedAt: row.invited_at.toISOString(),
    expiresAt: row.expires_at.toISOString(),
  };
}
