import { listHistory as listHistoryRows } from '@/db/queries/history';
import type { Context } from '@/lib/context';
import { writeCursor } from '@/lib/schemas/cursor';
import { historyPlace, type HistoryEntry, type HistoryQuery } from '@/lib/schemas/history';
import { accessUnit } from './access';
import { pageAfter } from './page-after';

const PAGE = 30;

/**
 * What happened to a unit, the latest first: outings with the reading they came back with, other readings, meter
 * swaps, closures, defects and lay-ups; what was voided or reversed stays, with why. `kind` narrows it.
 * Throws `not_found`, `forbidden`, and `invalid_input` on `cursor`.
 */
export async function listHistory(
  ctx: Context,
  unitId: string,
  query: HistoryQuery,
): Promise<{ items: HistoryEntry[]; nextCursor: string | null }> {
  const unit = await accessUnit(ctx, unitId, 'unit.read');
  const after = pageAfter(historyPlace, query.cursor);
  const limit = query.limit ?? PAGE;
  const rows = await listHistoryRows(ctx.db, unit.id, { kind: query.kind ?? null, after, limit: limit + 1 });
  const items = rows
    .slice(0, limit)
    .map(({ kind, id, place, facts }) => ({ kind, id, at: place, ...facts }) as HistoryEntry);
  const last = rows.length > limit ? rows[limit - 1] : undefined;
  return { items, nextCursor: last ? writeCursor({ at: last.place, rank: last.rank, id: last.id }) : null };
}
