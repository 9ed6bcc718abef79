import type { PartRow } from '@/db/queries/parts';
import type { LevelRow } from '@/db/queries/stock';
import { computeFree, isLow } from '@/lib/domain/stock';
import type { PartLevel, PartLine } from '@/lib/schemas/part';

/** What lies on a shelf as the API and the screens show it. */
export function toLevel(row: LevelRow): PartLevel {
  const level = { onHand: row.on_hand, reserved: row.reserved };
  return {
    dockId: row.dock_id,
    dockName: row.dock_name,
    ...level,
    free: computeFree(level),
    lowAt: row.low_at,
    low: isLow(level, row.low_at),
  };
}

/** A part in a list, with its shelves among `levels`. */
export function toPartLine(row: PartRow, levels: readonly LevelRow[]): PartLine {
  const own = levels.filter(({ part_id }) => part_id === row.id).map(toLevel);
  return {
    id: row.id,
    number: row.number,
    name: row.name,
    supplier: row.supplier,
    isKit: row.is_kit,
    low: row.retired_at === null && own.some(({ low }) => low),
    levels: own,
    retiredAt: row.retired_at?.toISOString() ?? null,
  };
}

/** Two parts in use never share a number. */
export const PART_TAKEN: Record<string, [path: string, message: string]> = {
  part_number: ['number', 'A part has that number already.'],
  part_pkey: ['id', 'Another part has this id.'],
};
