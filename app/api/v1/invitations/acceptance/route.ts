import { acceptInvitation } from '@/lib/actions/accept-invitation';
import { handlePublic } from '@/lib/http/handle';
import { acceptInvitation as acceptInvitationInput } from '@/lib/schemas/invitation';

export const POST = handlePublic({ body: acceptInvitationInput, status: 201 }, (ctx, { body }) =>
  acceptInvitation(ctx, body),
);
