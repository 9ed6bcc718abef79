import { sql, type Insertable, type Kysely, type Transaction } from 'kysely';
import type { DB, StockMoveTable } from '../tables';

/** Some of a part at some dock. */
export type Spot = { partId: string; dockId: string };

/** What lies on a shelf: what is on hand, what open tasks reserved of it, and of that what the task asked about did. */
export type LevelRow = {
  part_id: string;
  dock_id: string;
  dock_name: string;
  low_at: number | null;
  on_hand: number;
  reserved: number;
  own: number;
};

/**
 * What lies on the shelves of these docks, of all parts unless some are named; a shelf that nothing was ever put on
 * is none. `own` is what `taskId` reserved.
 */
export async function listLevels(
  db: Kysely<DB>,
  of: { dockIds: 'all' | readonly string[]; partIds?: readonly string[]; taskId?: string },
): Promise<LevelRow[]> {
  const docks = of.dockIds === 'all' ? null : [...of.dockIds];
  const parts = of.partIds ? [...of.partIds] : null;
  const { rows } = await sql<LevelRow>`
    select s.part_id, s.dock_id, d.name as dock_name, s.low_at,
           (select coalesce(sum(m.quantity), 0)::int from stock_move m
             where m.part_id = s.part_id and m.dock_id = s.dock_id) as on_hand,
           coalesce(r.reserved, 0)::int as reserved, coalesce(r.own, 0)::int as own
      from shelf s
      join dock d on d.id = s.dock_id
      left join lateral (
        select sum(o.quantity) as reserved, sum(o.quantity) filter (where o.task_id = ${of.taskId ?? null}) as own
          from reservation o
          join task t on t.id = o.task_id and t.ended_at is null
         where o.part_id = s.part_id and o.dock_id = s.dock_id and o.released_at is null) r on true
     where (${docks}::uuid[] is null or s.dock_id = any(${docks}::uuid[]))
       and (${parts}::uuid[] is null or s.part_id = any(${parts}::uuid[]))
     order by d.name, d.id, s.part_id`.execute(db);
  return rows;
}

/**
 * Locks the shelves of these spots, putting up those that are missing, in the order that every writer locks them
 * in; a transaction locks all that it wants at once. Answers what lies there now, by `spotKey`.
 */
export async function lockShelves(
  trx: Transaction<DB>,
  spots: readonly Spot[],
  taskId?: string,
): Promise<Map<string, LevelRow>> {
  if (spots.length === 0) return new Map();
  const wanted = new Map(spots.map((spot) => [spotKey(spot), spot]));
  const rows = [...wanted]
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([, { partId, dockId }]) => ({ part_id: partId, dock_id: dockId }));
  await trx
    .insertInto('shelf')
    .values(rows.map((row) => ({ ...row, low_at: null })))
    .onConflict((conflict) => conflict.columns(['part_id', 'dock_id']).doNothing())
    .execute();
  await sql`
    select 1 from shelf s
      join unnest(${rows.map((row) => row.part_id)}::uuid[], ${rows.map((row) => row.dock_id)}::uuid[])
        as wanted(part_id, dock_id) using (part_id, dock_id)
     order by s.part_id, s.dock_id for update of s`.execute(trx);
  const levels = await listLevels(trx, {
    dockIds: [...new Set(rows.map((row) => row.dock_id))],
    partIds: [...new Set(rows.map((row) => row.part_id))],
    ...(taskId && { taskId }),
  });
  const byKey = levels.map((row) => [spotKey({ partId: row.part_id, dockId: row.dock_id }), row] as const);
  return new Map(byKey.filter(([key]) => wanted.has(key)));
}

/** Names a shelf; sorts as the shelves are locked. */
export const spotKey = ({ partId, dockId }: Spot): string => `${partId} ${dockId}`;

/** Says from where on a shelf is low, null for never. Lock it first. */
export async function updateLowAt(
  trx: Transaction<DB>,
  { partId, dockId }: Spot,
  lowAt: number | null,
): Promise<void> {
  await trx
    .updateTable('shelf')
    .set({ low_at: lowAt })
    .where('part_id', '=', partId)
    .where('dock_id', '=', dockId)
    .execute();
}

/** Adds moves to the ledger. Lock their shelves first. */
export async function insertMoves(
  trx: Transaction<DB>,
  rows: readonly Insertable<StockMoveTable>[],
): Promise<void> {
  if (rows.length > 0)
    await trx
      .insertInto('stock_move')
      .values([...rows])
      .execute();
}

export type MoveRow = Awaited<ReturnType<typeof listMoves>>[number];

function selectMoves(db: Kysely<DB>) {
  return db
    .selectFrom('stock_move as m')
    .innerJoin('part as p', 'p.id', 'm.part_id')
    .innerJoin('dock as d', 'd.id', 'm.dock_id')
    .leftJoin('person as mover', 'mover.id', 'm.moved_by')
    .leftJoin('task as t', 't.id', 'm.task_id')
    .leftJoin('unit as u', 'u.id', 't.unit_id')
    .selectAll('m')
    .select([
      'p.number as part_number',
      'p.name as part_name',
      'd.name as dock_name',
      'd.time_zone',
      'mover.name as mover_name',
      't.title as task_title',
      'u.fleet_number',
    ])
    .select(
      sql<number>`(select sum(b.quantity)::int from stock_move b
        where b.part_id = m.part_id and b.dock_id = m.dock_id and b.seq <= m.seq)`.as('balance'),
    );
}

/** Moves, the latest first; `beforeSeq` goes on below a page's last. */
export function listMoves(
  db: Kysely<DB>,
  of: {
    dockIds: 'all' | readonly string[];
    partId?: string;
    taskId?: string;
    beforeSeq?: number;
    limit: number;
  },
) {
  let query = selectMoves(db);
  if (of.dockIds !== 'all')
    query = query.where('m.dock_id', '=', sql<string>`any(${[...of.dockIds]}::uuid[])`);
  if (of.partId) query = query.where('m.part_id', '=', of.partId);
  if (of.taskId) query = query.where('m.task_id', '=', of.taskId);
  if (of.beforeSeq !== undefined) query = query.where('m.seq', '<', of.beforeSeq);
  return query.orderBy('m.seq', 'desc').limit(of.limit).execute();
}

/** The moves that were written together under this id, in their order. */
export function listMovesOf(db: Kysely<DB>, pairId: string) {
  return selectMoves(db).where('m.pair_id', '=', pairId).orderBy('m.seq').execute();
}

/** What a closing took out of stock. */
export function listTaken(db: Kysely<DB>, closureId: string) {
  return db
    .selectFrom('stock_move')
    .select(['part_id', 'dock_id', 'quantity', 'task_id'])
    .where('pair_id', '=', closureId)
    .where('kind', '=', 'taken')
    .orderBy('seq')
    .execute();
}
