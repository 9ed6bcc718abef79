import type { Insertable, Transaction } from 'kysely';
import { listContents, lockParts, type PartRow } from '@/db/queries/parts';
import { insertMoves, listMovesOf, lockShelves, spotKey, type Spot } from '@/db/queries/stock';
import type { DB, StockMoveTable } from '@/db/tables';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import type { MoveKind } from '@/lib/domain/stock';
import { refuseField } from '@/lib/errors';
import type { RecordedMoves, RecordStockMove } from '@/lib/schemas/stock';
import { accessDock, accessPart } from './access';
import { refuseTaking } from './refuse-taking';
import { refusingTaken } from './refusing-taken';
import { toStockMove } from './shape-stock';

/** A change of one shelf: by so many, up or down. */
type Change = Spot & { kind: MoveKind; quantity: number };

/**
 * Receives, counts or moves stock, makes up a kit of its parts or breaks one up: one move a shelf, added to the
 * ledger. An id that was recorded already answers with its moves and writes nothing. Managers and mechanics of the
 * docks. Throws `not_found` or `forbidden` on `partId`, `dockId` or `toDockId`; `reason_needed` on `reason` when it
 * takes more than is free, `conflict` on `partId` for a part that is retired, `invalid_input` for what cannot be.
 */
export async function recordStockMove(ctx: Context, input: RecordStockMove): Promise<RecordedMoves> {
  await accessPart(ctx, input.partId, 'part.read', 'partId');
  await accessDock(ctx, input.dockId, 'stock.write');
  if (input.toDockId) await accessDock(ctx, input.toDockId, 'stock.write', 'toDockId');
  return refusingTaken({ stock_move_pkey: ['id', 'Another move has this id.'] }, () =>
    runTransaction(ctx.db, async (trx) => {
      const [part] = await lockParts(trx, [input.partId]);
      const before = await listMovesOf(trx, input.id);
      if (before.length === 0) await writeMoves(ctx, trx, part!, input);
      else if (before[0]!.part_id !== input.partId || before[0]!.dock_id !== input.dockId)
        throw refuseField('id', 'Another move has this id.', 'conflict');
      return { moves: (await listMovesOf(trx, input.id)).map(toStockMove) };
    }),
  );
}

async function writeMoves(
  ctx: Context,
  trx: Transaction<DB>,
  part: PartRow,
  input: RecordStockMove,
): Promise<void> {
  if (part.retired_at) throw refuseField('partId', 'is retired', 'conflict');
  const changes = await listChanges(trx, part, input);
  const levels = await lockShelves(trx, changes);
  const first = changes[0]!;
  if (input.kind === 'count') first.quantity = input.quantity - levels.get(spotKey(first))!.on_hand;
  else
    for (const change of changes)
      refuseTaking(levels.get(spotKey(change))!, -change.quantity, input.reason, {
        path: 'reason',
        name: change.partId === part.id ? null : change.name,
      });
  const common = {
    pair_id: input.id,
    task_id: null,
    closure_id: null,
    reason: input.reason ?? null,
    moved_at: ctx.now,
    moved_by: personIdOf(ctx.actor),
  };
  const rows = changes.map(({ partId, dockId, kind, quantity }, index): Insertable<StockMoveTable> => ({
    ...common,
    ...(index === 0 && { id: input.id }),
    part_id: partId,
    dock_id: dockId,
    kind,
    quantity,
  }));
  await insertMoves(trx, rows);
}

/** What a move changes, the part that is named first. */
async function listChanges(
  trx: Transaction<DB>,
  part: PartRow,
  input: RecordStockMove,
): Promise<(Change & { name: string })[]> {
  const at = { partId: part.id, dockId: input.dockId, name: part.name };
  switch (input.kind) {
    case 'receive':
      return [{ ...at, kind: 'received', quantity: input.quantity }];
    case 'count':
      return [{ ...at, kind: 'counted', quantity: 0 }];
    case 'move':
      return [
        { ...at, kind: 'moved_out', quantity: -input.quantity },
        { ...at, dockId: input.toDockId!, kind: 'moved_in', quantity: input.quantity },
      ];
    default: {
      const makes = input.kind === 'make_up';
      const kind = makes ? 'made_up' : 'broken_up';
      const kits = makes ? input.quantity : -input.quantity;
      const contents = await listContents(trx, [part.id]);
      if (contents.length === 0) throw refuseField('partId', 'is no kit that holds parts');
      return [
        { ...at, kind, quantity: kits },
        ...contents.map((one) => ({
          partId: one.part_id,
          dockId: input.dockId,
          name: one.name,
          kind: kind as MoveKind,
          quantity: -kits * one.quantity,
        })),
      ];
    }
  }
}
