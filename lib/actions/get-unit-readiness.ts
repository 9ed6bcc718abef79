import { listReadiness } from '@/db/queries/readiness';
import type { Context } from '@/lib/context';
import { refuseField } from '@/lib/errors';
import type { UnitReadiness } from '@/lib/schemas/availability';
import { toHours } from '@/lib/schemas/schedule-shape';
import { accessUnit } from './access';
import { toHolds, toStanding } from './shape-readiness';

/** How one unit stands now, with its last reading. Throws `not_found`, also for a retired unit, or `forbidden`. */
export async function getUnitReadiness(ctx: Context, id: string): Promise<UnitReadiness> {
  const unit = await accessUnit(ctx, id, 'unit.read');
  const [row] = await listReadiness(ctx.db, { unitId: unit.id }, ctx.now);
  if (!row) throw refuseField('id', 'The unit is retired.', 'not_found');
  const holds = toHolds(row, { at: ctx.now, onDay: null, plannedTenths: null });
  return {
    ...toStanding(row),
    state: row.outing_id ? 'out' : holds.length > 0 ? 'held' : 'ready',
    holds,
    dockName: unit.dock_name,
    timeZone: row.time_zone,
    shownHours: toHours(unit.shown_tenths),
    readAt: unit.read_at.toISOString(),
    outings: unit.outing_count,
    outingId: row.outing_id,
    startedAt: row.started_at?.toISOString() ?? null,
    dueBackAt: row.due_back_at?.toISOString() ?? null,
  };
}
