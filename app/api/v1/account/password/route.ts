import { changePassword } from '@/lib/actions/change-password';
import { clientAddress } from '@/lib/http/client-address';
import { handle } from '@/lib/http/handle';
import { noContent } from '@/lib/http/no-content';
import { changePassword as changePasswordInput } from '@/lib/schemas/account';

export const PUT = handle({ body: changePasswordInput }, async (ctx, { body, request }) => {
  await changePassword(ctx, { ...body, address: clientAddress(request.headers) });
  return noContent();
});
