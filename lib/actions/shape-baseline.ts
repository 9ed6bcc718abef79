import type { BaselineRow } from '@/db/queries/baselines';
import type { Baseline } from '@/lib/schemas/baseline';
import { toHours } from '@/lib/schemas/schedule-shape';

/** A baseline as the API and the screens show it: engine hours in decimals. */
export function toBaseline(row: BaselineRow): Baseline {
  return {
    id: row.id,
    unitId: row.unit_id,
    ruleId: row.rule_id,
    ruleName: row.rule_name,
    closedOn: row.closed_on,
    engineHours: toHours(row.engine_hours_tenths),
    outings: row.outings,
    note: row.note,
    recordedAt: row.recorded_at.toISOString(),
    recordedBy: row.recorded_by_name,
    withdrawnAt: row.withdrawn_at?.toISOString() ?? null,
    withdrawnBy: row.withdrawn_by_name,
  };
}
