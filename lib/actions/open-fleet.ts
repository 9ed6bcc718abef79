import { listDocks } from '@/db/queries/docks';
import { listModels } from '@/db/queries/models';
import { listReadiness } from '@/db/queries/readiness';
import { listRetiredUnits, listUnits } from '@/db/queries/units';
import type { Context } from '@/lib/context';
import { canSomewhere, visibleDocks, worksAt } from '@/lib/domain/access';
import { compareFleetNumbers } from '@/lib/domain/natural-order';
import type { FleetFilter, FleetPage } from '@/lib/schemas/fleet';
import { requireSomewhere } from './access';
import { toFleetUnit } from './shape-fleet-unit';

/**
 * The units of the docks the actor works at, in the natural order of their fleet numbers, each as it stands at this
 * moment; retired ones when asked for. A dock the actor does not work at narrows nothing.
 */
export async function openFleet(ctx: Context, filter: FleetFilter): Promise<FleetPage> {
  requireSomewhere(ctx, 'unit.read');
  const visible = visibleDocks(ctx.actor);
  const dockIds = filter.dock && worksAt(ctx.actor, filter.dock) ? [filter.dock] : visible;
  const retired = filter.state === 'retired';
  const [rows, readiness, docks, models] = await Promise.all([
    retired ? listRetiredUnits(ctx.db, dockIds) : listUnits(ctx.db, dockIds),
    retired ? [] : listReadiness(ctx.db, { dockIds }, ctx.now),
    listDocks(ctx.db, visible),
    listModels(ctx.db),
  ]);
  const standing = new Map(readiness.map((row) => [row.id, row]));
  const units = rows
    .map((row) => toFleetUnit(row, standing.get(row.id), ctx.now))
    .filter(({ modelId }) => !filter.model || modelId === filter.model)
    .filter(({ state }) => !filter.state || retired || state === filter.state)
    .sort((a, b) => compareFleetNumbers(a.fleetNumber, b.fleetNumber));
  return {
    units,
    docks: docks.map(({ id, name }) => ({ id, name })),
    models: models.map(({ id, name }) => ({ id, name })),
    empty: rows.length === 0 && !retired && !filter.dock,
    mayAdd: canSomewhere(ctx.actor, 'unit.write'),
  };
}
