import { checkOut } from '@/lib/actions/check-out';
import { handle } from '@/lib/http/handle';
import { createCheckOut } from '@/lib/schemas/check-out';

export const POST = handle({ body: createCheckOut, status: 201 }, (ctx, { body }) => checkOut(ctx, body));
