import { DockWaterline } from '@/components/waterline/DockWaterline';
import { FleetWaterline } from '@/components/waterline/FleetWaterline';
import type { WaterlineUnit } from '@/components/waterline/geometry';
import type { FleetUnit } from '@/lib/schemas/fleet';

/** A unit as the water line draws it; null when it is retired. */
export function toWaterline(unit: FleetUnit): WaterlineUnit | null {
  if (unit.state === null) return null;
  return {
    fleetNumber: unit.fleetNumber,
    href: `/units/${unit.id}`,
    tenthsToHold: unit.hoursToHold === null ? null : Math.round(unit.hoursToHold * 10),
    daysToHold: unit.daysToHold,
    outingsToHold: unit.outingsToHold,
    state: unit.state,
  };
}

/** The units listed as they float: one dock unit by unit, several docks as strips to compare. */
export function FleetPicture({ units }: { units: FleetUnit[] }) {
  const docks = [...new Map(units.map((unit) => [unit.dockId, unit.dockName]))]
    .map(([key, name]) => ({
      key,
      name,
      href: `/units?dock=${key}`,
      units: units.filter((unit) => unit.dockId === key).flatMap((unit) => toWaterline(unit) ?? []),
    }))
    .sort((a, b) => a.name.localeCompare(b.name, 'en'));
  const [first] = docks;
  if (!first) return null;
  return docks.length === 1 ? (
    <DockWaterline units={first.units} label={first.name} />
  ) : (
    <FleetWaterline docks={docks} label="The fleet on its water line" />
  );
}
