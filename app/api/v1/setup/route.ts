import { setUp } from '@/lib/actions/set-up';
import { handlePublic } from '@/lib/http/handle';
import { checkSetupToken } from '@/lib/http/setup-token';
import { setUp as setUpInput } from '@/lib/schemas/setup';

export const POST = handlePublic({ body: setUpInput, status: 201 }, (ctx, { body: { token, ...input } }) => {
  checkSetupToken(token);
  return setUp(ctx, input);
});
