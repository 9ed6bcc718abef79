import { listStock } from '@/lib/actions/list-stock';
import { handle } from '@/lib/http/handle';
import { stockQuery } from '@/lib/schemas/stock';

export const GET = handle({ query: stockQuery }, (ctx, { query }) => listStock(ctx, query));
