import { withdrawInvitation } from '@/lib/actions/withdraw-invitation';
import { handle } from '@/lib/http/handle';
import { noContent } from '@/lib/http/no-content';
import { idParams } from '@/lib/schemas/common';

export const DELETE = handle({ params: idParams }, async (ctx, { params }) => {
  await withdrawInvitation(ctx, params);
  return noContent();
});
