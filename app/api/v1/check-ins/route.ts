import { checkIn } from '@/lib/actions/check-in';
import { handle } from '@/lib/http/handle';
import { createCheckIn } from '@/lib/schemas/check-in';

export const POST = handle({ body: createCheckIn, status: 201 }, (ctx, { body }) => checkIn(ctx, body));
