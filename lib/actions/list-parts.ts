import { listParts as listPartRows } from '@/db/queries/parts';
import { listLevels, type LevelRow } from '@/db/queries/stock';
import type { Context } from '@/lib/context';
import { partPlace, type PartLine, type PartsQuery } from '@/lib/schemas/part';
import { requireFleetWide } from './access';
import { docksAsked } from './docks-asked';
import { pageByPlace } from './page-by-place';
import { toPartLine } from './shape-part';

const PAGE = 200;

/**
 * Parts with what lies of them at the docks asked for, low ones first, then by name. Throws `not_found` or
 * `forbidden` on `dockId`, `invalid_input` on `cursor`.
 */
export async function listParts(
  ctx: Context,
  query: PartsQuery,
): Promise<{ items: PartLine[]; nextCursor: string | null }> {
  requireFleetWide(ctx, 'part.read');
  const dockIds = await docksAsked(ctx, query.dockId, 'stock.read');
  const [rows, levels] = await Promise.all([
    listPartRows(ctx.db, { retired: query.retired ?? false }),
    listLevels(ctx.db, { dockIds }),
  ]);
  const levelsOf = new Map<string, LevelRow[]>(rows.map(({ id }) => [id, []]));
  for (const level of levels) levelsOf.get(level.part_id)?.push(level);
  const parts = rows
    .map((row) => toPartLine(row, levelsOf.get(row.id) ?? []))
    .filter((part) => query.low === undefined || part.low === query.low);
  return pageByPlace(parts, {
    schema: partPlace,
    placeOf: ({ low, name, id }) => ({ low, name, id }),
    compare: (a, b) =>
      Number(b.low) - Number(a.low) ||
      a.name.localeCompare(b.name, 'en') ||
      (a.id < b.id ? -1 : +(a.id > b.id)),
    cursor: query.cursor,
    limit: query.limit ?? PAGE,
  });
}
