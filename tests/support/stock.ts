import { randomUUID } from 'node:crypto';
import type { Kysely } from 'kysely';
import type { DB } from '@/db/tables';
import { createPart } from '@/lib/actions/create-part';
import { recordStockMove } from '@/lib/actions/record-stock-move';
import type { RecordStockMove } from '@/lib/schemas/stock';
import { asSystem, openDock } from './crew';

/** A part, or with `contents` a kit, through the action. */
export function addPart(
  db: Kysely<DB>,
  name: string,
  contents?: { partId: string; quantity: number }[],
): Promise<{ id: string }> {
  return createPart(asSystem(db, '2026-05-02T12:00:00Z'), {
    id: randomUUID(),
    number: name.toUpperCase().replaceAll(' ', '-'),
    name,
    ...(contents && { contents }),
  });
}

/** Two docks, and a kit of three gaskets and a needle with both parts of it: the ids of each. */
export async function openStock(db: Kysely<DB>) {
  const north = (await openDock(db)).dock.id;
  const south = (await openDock(db, { name: 'Cais Sul', fleetNumber: 'S-1' })).dock.id;
  const gasket = (await addPart(db, 'Gasket')).id;
  const needle = (await addPart(db, 'Needle')).id;
  const { id: kit } = await addPart(db, 'Carburettor kit', [
    { partId: gasket, quantity: 3 },
    { partId: needle, quantity: 1 },
  ]);
  return { north, south, gasket, needle, kit };
}

/** Puts so many of a part on a dock's shelf. */
export async function stockUp(
  db: Kysely<DB>,
  at: Pick<RecordStockMove, 'partId' | 'dockId' | 'quantity'>,
): Promise<void> {
  const ctx = asSystem(db, '2026-05-02T12:00:00Z');
  await recordStockMove(ctx, { kind: 'receive', id: randomUUID(), ...at });
}

/** What lies on each shelf, by the part's name and the dock's: the sum of its moves. */
export async function onShelves(db: Kysely<DB>): Promise<Record<string, number>> {
  const rows = await db
    .selectFrom('stock_move as m')
    .innerJoin('part as p', 'p.id', 'm.part_id')
    .innerJoin('dock as d', 'd.id', 'm.dock_id')
    .select(({ fn }) => ['p.name as part', 'd.name as dock', fn.sum<number>('m.quantity').as('on_hand')])
    .groupBy(['p.name', 'd.name'])
    .execute();
  return Object.fromEntries(rows.map(({ part, dock, on_hand }) => [`${part} at ${dock}`, Number(on_hand)]));
}
