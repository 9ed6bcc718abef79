import { changeAccount } from '@/lib/actions/change-account';
import { getAccount } from '@/lib/actions/get-account';
import { handle } from '@/lib/http/handle';
import { changeAccount as changeAccountInput } from '@/lib/schemas/account';

export const GET = handle({}, (ctx) => getAccount(ctx));

export const PATCH = handle({ body: changeAccountInput }, (ctx, { body }) => changeAccount(ctx, body));
