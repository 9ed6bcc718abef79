import { invitePerson } from '@/lib/actions/invite-person';
import { listInvitations } from '@/lib/actions/list-invitations';
import { handle } from '@/lib/http/handle';
import { createInvitation } from '@/lib/schemas/invitation';

export const GET = handle({}, async (ctx) => ({ items: await listInvitations(ctx), nextCursor: null }));

export const POST = handle({ body: createInvitation, status: 201 }, (ctx, { body }) =>
  invitePerson(ctx, body),
);
