import { listParts } from '@/db/queries/parts';
import { listLevels } from '@/db/queries/stock';
import type { Context } from '@/lib/context';
import { stockPlace, type StockLine, type StockQuery } from '@/lib/schemas/stock';
import { requireSomewhere } from './access';
import { docksAsked } from './docks-asked';
import { pageByPlace } from './page-by-place';
import { toLevel } from './shape-part';

const PAGE = 200;

/**
 * What lies on each shelf of the docks asked for, low ones first, then by the part's name. Throws `not_found` or
 * `forbidden` on `dockId`, `invalid_input` on `cursor`.
 */
export async function listStock(
  ctx: Context,
  query: StockQuery,
): Promise<{ items: StockLine[]; nextCursor: string | null }> {
  requireSomewhere(ctx, 'stock.read');
  const dockIds = await docksAsked(ctx, query.dockId, 'stock.read');
  const [parts, levels] = await Promise.all([
    listParts(ctx.db, { retired: false }),
    listLevels(ctx.db, { dockIds }),
  ]);
  const partOf = new Map(parts.map((part) => [part.id, part]));
  const lines = levels.flatMap((row) => {
    const part = partOf.get(row.part_id);
    if (!part) return [];
    return [{ ...toLevel(row), partId: part.id, number: part.number, name: part.name, isKit: part.is_kit }];
  });
  const key = ({ partId, dockId }: { partId: string; dockId: string }) => `${partId} ${dockId}`;
  return pageByPlace(
    lines.filter(({ low }) => query.low === undefined || low === query.low),
    {
      schema: stockPlace,
      placeOf: ({ low, name, partId, dockId }) => ({ low, name, partId, dockId }),
      compare: (a, b) =>
        Number(b.low) - Number(a.low) ||
        a.name.localeCompare(b.name, 'en') ||
        (key(a) < key(b) ? -1 : +(key(a) > key(b))),
      cursor: query.cursor,
      limit: query.limit ?? PAGE,
    },
  );
}
