import type { UnitRow } from '@/db/queries/units';
import { toHours } from '@/lib/schemas/schedule-shape';
import type { ScopedUnit } from '@/lib/domain/rule';
import type { Unit } from '@/lib/schemas/unit';

/** A unit as the API and the screens show it: engine hours in decimal hours. */
export function toUnit(row: UnitRow): Unit {
  return {
    id: row.id,
    fleetNumber: row.fleet_number,
    modelId: row.model_id,
    modelName: row.model_name,
    dockId: row.dock_id,
    dockName: row.dock_name,
    hin: row.hin,
    registration: row.registration,
    enteredServiceOn: row.entered_service_on,
    engineHours: toHours(row.engine_hours_tenths),
    outings: row.outing_count,
    carbCount: row.carb_count,
    specs: row.specs as Unit['specs'],
    readAt: row.read_at.toISOString(),
    retiredAt: row.retired_at?.toISOString() ?? null,
  };
}

/** What of a unit decides which rules are for it. */
export function toScopedUnit(row: UnitRow): ScopedUnit {
  return {
    modelId: row.model_id,
    propulsion: row.propulsion,
    stroke: row.stroke,
    carbCount: row.carb_count,
    dockId: row.dock_id,
  };
}
