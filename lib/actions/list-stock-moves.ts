import { listMoves } from '@/db/queries/stock';
import type { Context } from '@/lib/context';
import { writeCursor } from '@/lib/schemas/cursor';
import { movePlace, type StockMove, type StockMovesQuery } from '@/lib/schemas/stock';
import { accessPart, accessTask, requireSomewhere } from './access';
import { docksAsked } from './docks-asked';
import { pageAfter } from './page-after';
import { toStockMove } from './shape-stock';

const PAGE = 100;

/**
 * Moves of stock at the docks asked for, the latest first. Throws `not_found` or `forbidden` on `partId`, `taskId`
 * or `dockId`, `invalid_input` on `cursor`.
 */
export async function listStockMoves(
  ctx: Context,
  query: StockMovesQuery,
): Promise<{ items: StockMove[]; nextCursor: string | null }> {
  requireSomewhere(ctx, 'stock.read');
  const after = pageAfter(movePlace, query.cursor);
  const dockIds = await docksAsked(ctx, query.dockId, 'stock.read');
  if (query.partId) await accessPart(ctx, query.partId, 'part.read', 'partId');
  if (query.taskId) await accessTask(ctx, query.taskId, 'task.read', 'taskId');
  const limit = query.limit ?? PAGE;
  const rows = await listMoves(ctx.db, {
    dockIds,
    ...(query.partId && { partId: query.partId }),
    ...(query.taskId && { taskId: query.taskId }),
    ...(after && { beforeSeq: after.seq }),
    limit: limit + 1,
  });
  const page = rows.slice(0, limit);
  const last = page.at(-1);
  return {
    items: page.map(toStockMove),
    nextCursor: last && rows.length > limit ? writeCursor({ seq: last.seq }) : null,
  };
}
