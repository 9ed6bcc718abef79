import { resendInvitation } from '@/lib/actions/resend-invitation';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';

export const POST = handle({ params: idParams, status: 201 }, (ctx, { params }) =>
  resendInvitation(ctx, params),
);
