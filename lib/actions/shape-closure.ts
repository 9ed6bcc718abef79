import type { ClosureRow } from '@/db/queries/closures';
import { toHours } from '@/lib/schemas/schedule-shape';
import type { Closure } from '@/lib/schemas/task';
import { toNamed } from './shape-task';

/** A closure as the API and the screens show it: engine hours in decimal hours. */
export function toClosure(row: ClosureRow): Closure {
  return {
    id: row.id,
    taskId: row.task_id,
    unitId: row.unit_id,
    ruleId: row.rule_id,
    closedAt: row.closed_at.toISOString(),
    closedOn: row.closed_on,
    engineHours: toHours(row.engine_hours_tenths),
    outings: row.outings,
    minutes: row.minutes,
    note: row.note,
    results: row.results,
    signOffs: row.sign_offs,
    partsUsed: row.parts_used,
    heldSince: row.held_since_at?.toISOString() ?? null,
    closedBy: toNamed(row.closed_by, row.closer_name),
    reversedAt: row.reversed_at?.toISOString() ?? null,
    reversedBy: toNamed(row.reversed_by, row.reverser_name),
    reverseReason: row.reverse_reason,
  };
}
