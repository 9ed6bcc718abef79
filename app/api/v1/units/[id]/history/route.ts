import { listHistory } from '@/lib/actions/list-history';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { historyQuery } from '@/lib/schemas/history';

export const GET = handle({ params: idParams, query: historyQuery }, (ctx, { params, query }) =>
  listHistory(ctx, params.id, query),
);
