import type { MoveRow } from '@/db/queries/stock';
import type { StockMove } from '@/lib/schemas/stock';
import { toNamed } from './shape-task';

/** A move of the ledger as the API and the screens show it. */
export function toStockMove(row: MoveRow): StockMove {
  return {
    id: row.id,
    kind: row.kind,
    partId: row.part_id,
    partNumber: row.part_number,
    partName: row.part_name,
    dockId: row.dock_id,
    dockName: row.dock_name,
    timeZone: row.time_zone,
    quantity: row.quantity,
    balance: row.balance,
    task:
      row.task_id === null
        ? null
        : { id: row.task_id, title: row.task_title ?? '', fleetNumber: row.fleet_number ?? '' },
    closureId: row.closure_id,
    reason: row.reason,
    movedAt: row.moved_at.toISOString(),
    movedBy: toNamed(row.moved_by, row.mover_name),
  };
}
