import { listClosings } from '@/lib/actions/list-closings';
import { handle } from '@/lib/http/handle';
import { closingsQuery } from '@/lib/schemas/closing';
import { idParams } from '@/lib/schemas/common';

export const GET = handle({ params: idParams, query: closingsQuery }, async (ctx, { params, query }) => ({
  items: await listClosings(ctx, params.id, query),
  nextCursor: null,
}));
