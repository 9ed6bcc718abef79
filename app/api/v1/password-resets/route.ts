import { askPasswordReset } from '@/lib/actions/ask-password-reset';
import { clientAddress } from '@/lib/http/client-address';
import { handlePublic } from '@/lib/http/handle';
import { askPasswordReset as askPasswordResetInput } from '@/lib/schemas/password-reset';

export const POST = handlePublic(
  { body: askPasswordResetInput, status: 202 },
  async (ctx, { body, request }) => {
    await askPasswordReset(ctx, { ...body, address: clientAddress(request.headers) });
    return { detail: 'If somebody here has this e-mail address, a letter is on its way.' };
  },
);
