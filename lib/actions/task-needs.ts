import type { Kysely } from 'kysely';
import { getTaskNeeds, listNeedSources, type TaskNeedsRow } from '@/db/queries/reservations';
import { findUnit } from '@/db/queries/units';
import type { DB } from '@/db/tables';
import { ruleApplies } from '@/lib/domain/rule';
import { computeNeeds, computeTaskNeeds, type PartCount } from '@/lib/domain/stock';
import { toScopedUnit } from './shape-unit';

/**
 * What a task needs, scaled to its unit, with the row it was computed from. A follow-up for one place needs what the
 * rule with its procedure, else the rule of the work it comes from, asks for at that place.
 */
export async function loadTaskNeeds(
  db: Kysely<DB>,
  taskId: string,
): Promise<{ row: TaskNeedsRow; needs: PartCount[] }> {
  const row = await getTaskNeeds(db, taskId);
  const unit = await findUnit(db, row.unit_id);
  const counts = { engines: row.engines, cylinders: row.cylinders, carbCount: row.carb_count };
  const only = row.only_per && row.only_place !== null ? { per: row.only_per, place: row.only_place } : null;
  const asked = (await listNeedSources(db, taskId))
    .filter(({ own, scope }) => own || (unit && ruleApplies(scope, toScopedUnit(unit))))
    .map(({ parts }) => computeNeeds(parts, counts, only))
    .find((needs) => needs.length > 0);
  return { row, needs: computeTaskNeeds(asked ?? [], row.said) };
}
