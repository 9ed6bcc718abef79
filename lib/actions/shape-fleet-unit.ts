import type { ReadinessRow } from '@/db/queries/readiness';
import type { UnitRow } from '@/db/queries/units';
import type { FleetUnit } from '@/lib/schemas/fleet';
import { toHolds, toStanding } from './shape-readiness';
import { toUnit } from './shape-unit';

/** A unit with how it stands at an instant; a retired one stands nowhere. */
export function toFleetUnit(row: UnitRow, readiness: ReadinessRow | undefined, now: Date): FleetUnit {
  const unit = toUnit(row);
  if (!readiness) {
    const nothing = { hoursToHold: null, outingsToHold: null, daysToHold: null, holdingRuleName: null };
    return { ...unit, ...nothing, state: null, holds: [] };
  }
  const { hoursToHold, outingsToHold, daysToHold, holdingRuleName } = toStanding(readiness);
  const holds = toHolds(readiness, { at: now, onDay: null, plannedTenths: null });
  const state = readiness.outing_id ? 'out' : holds.length > 0 ? 'held' : 'ready';
  return { ...unit, hoursToHold, outingsToHold, daysToHold, holdingRuleName, state, holds };
}
