import {
  listReadingsToReview,
  listUnitReadings,
  type After,
  type ListedReading,
} from '@/db/queries/reading-list';
import type { Context } from '@/lib/context';
import { visibleDocks } from '@/lib/domain/access';
import { refuseField } from '@/lib/errors';
import { instantPlace, writeCursor } from '@/lib/schemas/cursor';
import type { Reading, ReadingsQuery } from '@/lib/schemas/reading';
import { accessUnit, requireSomewhere } from './access';
import { pageAfter } from './page-after';
import { toReading } from './shape-reading';

const PAGE = 100;

/**
 * A unit's readings, void ones too, or with `review` "open" those that wait for a manager; the latest first.
 * Throws `invalid_input` on `unitId` when neither is asked for or on `cursor`, `not_found`, and `forbidden`: the
 * open reviews are for managers.
 */
export async function listReadings(
  ctx: Context,
  query: ReadingsQuery,
): Promise<{ items: Reading[]; nextCursor: string | null }> {
  const limit = query.limit ?? PAGE;
  const place = pageAfter(instantPlace, query.cursor);
  const after = place && { takenAt: new Date(place.at), id: place.id };
  const rows = await chosen(ctx, query, after, limit + 1);
  const items = rows.slice(0, limit).map(toReading);
  const last = rows.length > limit ? items.at(-1) : undefined;
  return { items, nextCursor: last ? writeCursor({ at: last.at, id: last.id }) : null };
}

async function chosen(
  ctx: Context,
  query: ReadingsQuery,
  after: After,
  limit: number,
): Promise<ListedReading[]> {
  if (query.review) requireSomewhere(ctx, 'reading.review');
  if (query.unitId) {
    const unit = await accessUnit(ctx, query.unitId, query.review ? 'reading.review' : 'unit.read', 'unitId');
    return query.review
      ? listReadingsToReview(ctx.db, { unitId: unit.id }, after, limit)
      : listUnitReadings(ctx.db, unit.id, after, limit);
  }
  if (query.review) return listReadingsToReview(ctx.db, { dockIds: visibleDocks(ctx.actor) }, after, limit);
  throw refuseField('unitId', 'name a unit, or ask for review=open');
}
