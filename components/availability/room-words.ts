import type { WaterlineUnit } from '@/components/waterline/geometry';
import type { UnitState } from '@/components/state/state-words';
import type { ReadyUnit } from '@/lib/schemas/availability';

/** What is left before the next hold, by every measure that counts: "12.4 h or 9 days left; Impeller check comes first". */
export function roomText(unit: ReadyUnit): string {
  const { hoursToHold: hours, outingsToHold: outings, daysToHold: days } = unit;
  const left = [
    hours === null ? null : `${hours.toFixed(1)} h`,
    outings === null ? null : `${outings} ${outings === 1 ? 'outing' : 'outings'}`,
    days === null ? null : `${days} ${days === 1 ? 'day' : 'days'}`,
  ].filter((text) => text !== null);
  if (left.length === 0) return 'No hold ahead';
  if (!unit.holdingRuleName) return `${left.join(' or ')} left`;
  return left.length === 1
    ? `${left[0]} left before ${unit.holdingRuleName}`
    : `${left.join(' or ')} left; ${unit.holdingRuleName} comes first`;
}

/** The unit as the water line draws it. */
export function toWaterline(unit: ReadyUnit, state: UnitState, href?: string): WaterlineUnit {
  return {
    fleetNumber: unit.fleetNumber,
    href,
    tenthsToHold: unit.hoursToHold === null ? null : Math.round(unit.hoursToHold * 10),
    daysToHold: unit.daysToHold,
    state,
  };
}
