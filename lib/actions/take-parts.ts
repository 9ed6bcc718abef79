import type { Transaction } from 'kysely';
import { listPartsOf } from '@/db/queries/parts';
import { releaseReservations } from '@/db/queries/reservations';
import { insertMoves, listTaken, lockShelves, spotKey, type LevelRow } from '@/db/queries/stock';
import type { DB } from '@/db/tables';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import type { ClosedPart } from '@/lib/domain/closed-work';
import { refuseField } from '@/lib/errors';
import type { PartUsed } from '@/lib/schemas/task-parts';
import { accessDock } from './access';
import { refuseTaking } from './refuse-taking';

/** What a closing takes out, each line held against what the lines above it left. */
export type Taking = {
  taskId: string;
  /** The unit's: where a line without a dock takes from. */
  dockId: string;
  used: readonly PartUsed[];
};

/**
 * Locks the shelves that a closing takes from and checks what it takes: parts known, docks one works at, and no
 * more than is there without a stated reason. Answers what is kept with the closure, and releases what was set aside
 * for the task. The caller has locked the task. Throws `not_found` or `forbidden` on a line's `partId` or `dockId`,
 * `reason_needed` on its `reason`.
 */
export async function checkPartsUsed(
  ctx: Context,
  trx: Transaction<DB>,
  { taskId, dockId, used }: Taking,
): Promise<ClosedPart[]> {
  const ids = used.map(({ partId }) => partId);
  const rows = ids.length > 0 ? await listPartsOf(trx, ids) : [];
  const parts = new Map(rows.map((part) => [part.id, part]));
  const docks = new Map<string, string>();
  for (const [index, line] of used.entries()) {
    if (!parts.has(line.partId))
      throw refuseField(`partsUsed.${index}.partId`, 'is no part of this stock', 'not_found');
    const dock = line.dockId ?? dockId;
    if (!docks.has(dock)) {
      const row = await accessDock({ ...ctx, db: trx }, dock, 'stock.write', `partsUsed.${index}.dockId`);
      docks.set(dock, row.name);
    }
  }
  const spots = used.map((line) => ({ partId: line.partId, dockId: line.dockId ?? dockId }));
  const levels = await lockShelves(trx, spots, taskId);
  const taken = used.map((line, index): ClosedPart => {
    const spot = spots[index]!;
    const level = levels.get(spotKey(spot))!;
    const { number, name } = parts.get(line.partId)!;
    refuseTaking(level, line.quantity, line.reason, { path: `partsUsed.${index}.reason`, name });
    levels.set(spotKey(spot), afterTaking(level, line.quantity));
    return {
      ...{ partId: line.partId, number, name, quantity: line.quantity },
      ...{ dockId: spot.dockId, dockName: docks.get(spot.dockId)!, reason: line.reason ?? null },
    };
  });
  await releaseReservations(trx, { taskId, at: ctx.now, by: personIdOf(ctx.actor) });
  return taken;
}

/** What was set aside for the task goes first. */
function afterTaking(level: LevelRow, quantity: number): LevelRow {
  const own = Math.min(level.own, quantity);
  return {
    ...level,
    on_hand: level.on_hand - quantity,
    own: level.own - own,
    reserved: level.reserved - own,
  };
}

/** Takes out of stock what `checkPartsUsed` answered, as moves of the closure. */
export async function takeParts(
  ctx: Context,
  trx: Transaction<DB>,
  of: { taskId: string; closureId: string; taken: readonly ClosedPart[] },
): Promise<void> {
  await insertMoves(
    trx,
    of.taken.map(({ partId, dockId, quantity, reason }) => ({
      part_id: partId,
      dock_id: dockId,
      quantity: -quantity,
      kind: 'taken' as const,
      pair_id: of.closureId,
      task_id: of.taskId,
      closure_id: of.closureId,
      reason,
      moved_at: ctx.now,
      moved_by: personIdOf(ctx.actor),
    })),
  );
}

/** Puts back all that a closure took, for the reason that it is reversed. The caller has locked the closure. */
export async function putPartsBack(
  ctx: Context,
  trx: Transaction<DB>,
  { closureId, reason }: { closureId: string; reason: string },
): Promise<void> {
  const taken = await listTaken(trx, closureId);
  await lockShelves(
    trx,
    taken.map(({ part_id, dock_id }) => ({ partId: part_id, dockId: dock_id })),
  );
  await insertMoves(
    trx,
    taken.map((row) => ({
      ...row,
      quantity: -row.quantity,
      kind: 'put_back' as const,
      pair_id: closureId,
      closure_id: closureId,
      reason,
      moved_at: ctx.now,
      moved_by: personIdOf(ctx.actor),
    })),
  );
}
