import type { LayUpRow } from '@/db/queries/lay-ups';
import type { LayUp } from '@/lib/schemas/lay-up';

/** A lay-up as the API and the screens show it. */
export function toLayUp(row: LayUpRow): LayUp {
  return {
    id: row.id,
    unitId: row.unit_id,
    fleetNumber: row.fleet_number,
    fromOn: row.from_on,
    untilOn: row.until_on,
    reason: row.reason,
    recordedAt: row.recorded_at.toISOString(),
    recordedBy: row.recorder_name,
    endedAt: row.ended_at?.toISOString() ?? null,
  };
}
