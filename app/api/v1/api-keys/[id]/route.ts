import { revokeApiKey } from '@/lib/actions/revoke-api-key';
import { handle } from '@/lib/http/handle';
import { noContent } from '@/lib/http/no-content';
import { idParams } from '@/lib/schemas/common';

export const DELETE = handle({ params: idParams }, async (ctx, { params }) => {
  await revokeApiKey(ctx, params);
  return noContent();
});
