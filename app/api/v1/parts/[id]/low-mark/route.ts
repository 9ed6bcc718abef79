import { markLow } from '@/lib/actions/mark-low';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { markLow as markLowInput } from '@/lib/schemas/stock';

export const PUT = handle({ params: idParams, body: markLowInput }, (ctx, { params, body }) =>
  markLow(ctx, params.id, body),
);
