import { askPasswordReset } from '@/lib/actions/ask-password-reset';
import { handlePublic } from '@/lib/http/handle';
import { askPasswordReset as askPasswordResetInput } from '@/lib/schemas/password-reset';

export const POST = handlePublic({ body: askPasswordResetInput, status: 202 }, async (ctx, { body }) => {
  await askPasswordReset(ctx, body);
  return { detail: 'If somebody here has this e-mail address, a letter is on its way.' };
});
