import type { UnitState } from '@/components/state/state-words';
import { USUAL_PACE } from '@/lib/domain/readiness';

/** One unit as the water line draws it. */
export type WaterlineUnit = {
  fleetNumber: string;
  href?: string;
  /** Tenths of an engine hour left before the next hold; negative when past it; null without such a limit. */
  tenthsToHold: number | null;
  /** Days left before the next hold; negative when past it; null without such a limit. */
  daysToHold: number | null;
  /** Outings left before the next hold; negative when past it; null or left out without such a limit. */
  outingsToHold?: number | null;
  state: UnitState;
  /** How much the unit runs in a day of the calendar, in tenths of an hour. */
  hoursPerDayTenths?: number;
};

/** A scale: what its top stands for, and into how many steps it is cut. */
export type Scale = { tenths: number; days: number; steps: number };

/** Every scale keeps five hours to three days, so what is sooner does not change with the scale. */
const scales: readonly Scale[] = [
  { tenths: 100, days: 6, steps: 2 },
  { tenths: 250, days: 15, steps: 5 },
  { tenths: 500, days: 30, steps: 5 },
  { tenths: 1000, days: 60, steps: 5 },
  { tenths: 2500, days: 150, steps: 5 },
  { tenths: 5000, days: 300, steps: 5 },
];
const largest: Scale = { tenths: 5000, days: 300, steps: 5 };

/** The lowest fraction drawn: the deep is half as tall as the air above the line. */
export const deepest = -0.5;

export type Governing = { by: 'hours' | 'days' | 'outings'; amount: number };

/**
 * Which limit comes soonest. With a rate above zero, hours are turned into days by it. Without one hours and days
 * are taken as fractions of the scale, which treats five hours as three days; an outing always counts as an hour at
 * that pace. Of two alike, hours are named before days. Null when the unit has no limit ahead.
 */
export function governingLimit(unit: WaterlineUnit): Governing | null {
  const {
    tenthsToHold: tenths,
    daysToHold: days,
    outingsToHold: outings = null,
    hoursPerDayTenths: rate,
  } = unit;
  const tenthsADay = rate !== undefined && rate > 0 ? rate : USUAL_PACE.tenthsPerDay;
  const limits = [
    ...(tenths === null ? [] : [{ by: 'hours', amount: tenths, inDays: tenths / tenthsADay } as const]),
    ...(days === null ? [] : [{ by: 'days', amount: days, inDays: days } as const]),
    ...(outings === null
      ? []
      : [{ by: 'outings', amount: outings, inDays: outings / USUAL_PACE.outingsPerDay } as const]),
  ];
  const [first, ...others] = limits;
  if (!first) return null;
  const { by, amount } = others.reduce<(typeof limits)[number]>(
    (soonest, limit) => (limit.inDays < soonest.inDays ? limit : soonest),
    first,
  );
  return { by, amount };
}

/** How high a unit floats on `scale`: 1 is its top, 0 the water line, negative below. Not clipped. */
export function heightOn(scale: Scale, limit: Governing): number {
  switch (limit.by) {
    case 'hours':
      return limit.amount / scale.tenths;
    case 'days':
      return limit.amount / scale.days;
    case 'outings':
      return (limit.amount * 10) / scale.tenths;
  }
}

/**
 * The finest scale that shows every unit past its hold, and at least three quarters of those afloat; the
 * few with much more left are drawn at the top. The coarsest when none does.
 */
export function chooseScale(units: readonly WaterlineUnit[]): Scale {
  const limits = units.map(governingLimit).filter((limit) => limit !== null);
  const afloat = limits.filter((limit) => limit.amount >= 0);
  return (
    scales.find((scale) => {
      const shown = afloat.filter((limit) => heightOn(scale, limit) <= 1).length;
      const past = limits.every((limit) => heightOn(scale, limit) >= deepest);
      return past && shown * 4 >= afloat.length * 3;
    }) ?? largest
  );
}

/** The units by how low they lie, those without a limit last. The array given is left as it is. */
export function sortLowestFirst(units: readonly WaterlineUnit[]): WaterlineUnit[] {
  const height = (unit: WaterlineUnit) => {
    const limit = governingLimit(unit);
    return limit ? heightOn(largest, limit) : Infinity;
  };
  return units.toSorted((a, b) => {
    const [left, right] = [height(a), height(b)];
    return left === right
      ? a.fleetNumber.localeCompare(b.fleetNumber, 'en', { numeric: true })
      : left - right;
  });
}

export type Placement = {
  /** 1 at the top of the scale, 0 on the water line, `deepest` at the bottom. */
  height: number;
  /** The true amount lies beyond the scale's end. */
  beyond: boolean;
  limit: Governing | null;
};

/** Where a unit is drawn. One without a limit floats at the top. */
export function placeUnit(unit: WaterlineUnit, scale: Scale): Placement {
  const limit = governingLimit(unit);
  if (!limit) return { height: 1, beyond: false, limit };
  const height = heightOn(scale, limit);
  const drawn = Math.min(1, Math.max(deepest, height));
  return { height: drawn, beyond: drawn !== height, limit };
}

/** Turns a height into a distance from the top, when the whole picture is `total` tall. */
export function distanceFromTop(height: number, total: number): number {
  return ((1 - height) / (1 - deepest)) * total;
}

export type Tick = { height: number; hours: number; days: number };

/** The ticks of a scale from its top down into the deep, with whole hours and days beside them. */
export function ticksOf(scale: Scale): Tick[] {
  const below = Math.floor(-deepest * scale.steps);
  return Array.from({ length: scale.steps + below + 1 }, (_, index) => {
    const step = scale.steps - index;
    return {
      height: step / scale.steps,
      hours: (step * scale.tenths) / scale.steps / 10,
      days: (step * scale.days) / scale.steps,
    };
  });
}
