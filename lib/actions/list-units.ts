import { listUnits as listUnitRows, type UnitRow } from '@/db/queries/units';
import type { Context } from '@/lib/context';
import { compareFleetNumbers } from '@/lib/domain/natural-order';
import { writeCursor } from '@/lib/schemas/cursor';
import { unitPlace, type Unit, type UnitsQuery } from '@/lib/schemas/unit';
import { docksAsked } from './docks-asked';
import { pageAfter } from './page-after';
import { toUnit } from './shape-unit';

type Place = { fleetNumber: string; id: string };

/**
 * The units of the docks the actor works at, in the natural order of their fleet numbers; `dockId` narrows them, and
 * without a `limit` all are answered. Throws `not_found` or `forbidden` on `dockId`, `invalid_input` on `cursor`.
 */
export async function listUnits(
  ctx: Context,
  query: UnitsQuery,
): Promise<{ items: Unit[]; nextCursor: string | null }> {
  const dockIds = await docksAsked(ctx, query.dockId, 'unit.read');
  const after = pageAfter(unitPlace, query.cursor);
  const rows = await listUnitRows(ctx.db, dockIds);
  const rest = rows
    .sort((a, b) => compare(placeOf(a), placeOf(b)))
    .filter((row) => !after || compare(placeOf(row), after) > 0);
  const items = rest.slice(0, query.limit ?? rest.length).map(toUnit);
  const last = items.length < rest.length ? items.at(-1) : undefined;
  return { items, nextCursor: last ? writeCursor({ fleetNumber: last.fleetNumber, id: last.id }) : null };
}

function placeOf(row: UnitRow): Place {
  return { fleetNumber: row.fleet_number, id: row.id };
}

function compare(a: Place, b: Place): number {
  return compareFleetNumbers(a.fleetNumber, b.fleetNumber) || (a.id < b.id ? -1 : a.id > b.id ? 1 : 0);
}
