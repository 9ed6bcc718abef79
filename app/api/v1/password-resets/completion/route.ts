import { resetPassword } from '@/lib/actions/reset-password';
import { handlePublic } from '@/lib/http/handle';
import { noContent } from '@/lib/http/no-content';
import { resetPassword as resetPasswordInput } from '@/lib/schemas/password-reset';

export const POST = handlePublic({ body: resetPasswordInput }, async (ctx, { body }) => {
  await resetPassword(ctx, body);
  return noContent();
});
