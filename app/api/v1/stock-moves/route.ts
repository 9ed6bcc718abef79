import { listStockMoves } from '@/lib/actions/list-stock-moves';
import { recordStockMove } from '@/lib/actions/record-stock-move';
import { handle } from '@/lib/http/handle';
import { recordStockMove as recordStockMoveInput, stockMovesQuery } from '@/lib/schemas/stock';

export const GET = handle({ query: stockMovesQuery }, (ctx, { query }) => listStockMoves(ctx, query));

export const POST = handle({ body: recordStockMoveInput, status: 201 }, (ctx, { body }) =>
  recordStockMove(ctx, body),
);
