/**
 * The availability outlook: for a dock and each day to come, how many units are expected ready, against how many are
 * usually wanted on such a day, and which duties make a day short. Days are indices, 0 being today.
 */
import { normalChance, normalQuantile } from './normal';

/**
 * A duty that holds its unit when it is not done: the chance that it has come to hold by each day (`computeChances`
 * of its meter, what is left before the hold; 0 and then 1 for a date), and the days on which it is planned to be in
 * the workshop, from `first` to `last`; null when it is not planned. Done, it holds no more.
 */
export type HoldingDuty = {
  dutyId: string;
  chanceBy: ArrayLike<number>;
  planned: { first: number; last: number } | null;
};

/** A unit of the dock: held until a day by what is no duty (a defect, a lay-up; Infinity: no end in sight), or not. */
export type OutlookUnit = { unitId: string; heldUntil: number; duties: readonly HoldingDuty[] };

export type OutlookDay = {
  /** Units expected ready, and the range that eight of ten such days lie in. */
  expected: number;
  least: number;
  most: number;
  /** Units usually wanted; 0 when the dock is shut. */
  wanted: number;
  /** The chance that fewer are ready than are wanted. */
  chanceShort: number;
  /** Fewer are expected ready than are wanted. */
  isShort: boolean;
  /** On a short day, the duties that take units away, those that take most first, as expected units. */
  causes: { dutyId: string; unitId: string; units: number }[];
};

/** A duty that takes less of a unit than this is no cause worth naming. */
const LEAST_CAUSE = 0.05;
const MOST_CAUSES = 10;

/**
 * The outlook of one dock. A unit is ready when nothing holds it: it is not held otherwise, none of its duties has
 * come to hold, and none has it in the workshop. Units and duties are taken as independent, so the number ready is a
 * sum of independent yes-or-no chances (Poisson's binomial): its mean is Σ p, its variance Σ p (1 − p). Chances to be
 * short use the normal approximation with a correction of half a unit.
 */
export function computeOutlook(units: readonly OutlookUnit[], wanted: readonly number[]): OutlookDay[] {
  return wanted.map((wantedToday, day) => {
    const chances = units.map((unit) => chanceReady(unit, day));
    const expected = chances.reduce((sum, chance) => sum + chance, 0);
    const spread = Math.sqrt(chances.reduce((sum, chance) => sum + chance * (1 - chance), 0));
    const around = normalQuantile(0.9) * spread;
    const isShort = expected < wantedToday - 1e-9;
    return {
      expected,
      least: Math.max(0, Math.floor(expected - around + 1e-9)),
      most: Math.min(units.length, Math.ceil(expected + around - 1e-9)),
      wanted: wantedToday,
      chanceShort: chanceBelow(wantedToday, expected, spread),
      isShort,
      causes: isShort ? findCauses(units, day) : [],
    };
  });
}

/** The chance that fewer than `wanted` are ready. */
function chanceBelow(wanted: number, expected: number, spread: number): number {
  if (wanted <= 0) return 0;
  const most = Math.ceil(wanted) - 1;
  if (spread < 1e-9) return expected <= most + 1e-9 ? 1 : 0;
  return normalChance((most + 0.5 - expected) / spread);
}

/** The chance that a duty takes its unit away on a day. */
function chanceHeld({ chanceBy, planned }: HoldingDuty, day: number): number {
  if (planned && day >= planned.first) return day <= planned.last ? 1 : 0;
  return chanceBy[Math.min(day, chanceBy.length - 1)] ?? 0;
}

function chanceReady({ heldUntil, duties }: OutlookUnit, day: number): number {
  if (day < heldUntil) return 0;
  return duties.reduce((chance, duty) => chance * (1 - chanceHeld(duty, day)), 1);
}

/** What each duty takes: how much likelier its unit would be ready without it. */
function findCauses(units: readonly OutlookUnit[], day: number): OutlookDay['causes'] {
  return units
    .flatMap((unit) =>
      unit.duties.map((duty) => {
        const without = { ...unit, duties: unit.duties.filter((other) => other !== duty) };
        const taken = chanceReady(without, day) - chanceReady(unit, day);
        return { dutyId: duty.dutyId, unitId: unit.unitId, units: taken };
      }),
    )
    .filter((cause) => cause.units >= LEAST_CAUSE)
    .sort((a, b) => b.units - a.units)
    .slice(0, MOST_CAUSES);
}

/** A day's hires of a dock in the past: units out at once at most, of those it had. */
export type HireDay = { weekday: number; dayOfYear: number; out: number };

/** How near in the year a day must be to be of the same season, either way. */
const SEASON_DAYS = 21;
/** Wanted is what would have done on four of five such days. */
const SERVED = 0.8;

/**
 * How many units are usually wanted on a weekday (0 Monday) of a season (day of the year, 1 to 366): what served four
 * of five past days of that weekday within three weeks of it in any year; null with fewer than four such days.
 */
export function computeWanted(past: readonly HireDay[], weekday: number, dayOfYear: number): number | null {
  const alike = past.filter((day) => {
    const apart = Math.abs(day.dayOfYear - dayOfYear);
    return day.weekday === weekday && Math.min(apart, 365 - apart) <= SEASON_DAYS;
  });
  if (alike.length < 4) return null;
  const out = alike.map((day) => day.out).sort((a, b) => a - b);
  return out[Math.ceil(SERVED * out.length) - 1]!;
}

/** What would help a short day: this duty, planned there, gives its unit back on so many short days. */
export type Relief = { dutyId: string; unitId: string; doBefore: number; shortDays: number };

/**
 * Which duties to do when to avoid short days: those not yet planned that take their unit away on a short day, to be
 * done before the first such day on which they take half a unit or more; those that help on most days first. A duty
 * with no day left before it is to be done today.
 */
export function findReliefs(units: readonly OutlookUnit[], outlook: readonly OutlookDay[]): Relief[] {
  const reliefs = new Map<string, Relief>();
  const unplanned = new Set(
    units.flatMap(({ duties }) => duties.flatMap(({ dutyId, planned }) => (planned ? [] : [dutyId]))),
  );
  outlook.forEach(({ causes }, day) => {
    for (const { dutyId, unitId, units: taken } of causes) {
      if (!unplanned.has(dutyId) || taken < 0.5) continue;
      const known = reliefs.get(dutyId);
      if (known) known.shortDays += 1;
      else reliefs.set(dutyId, { dutyId, unitId, doBefore: day, shortDays: 1 });
    }
  });
  return [...reliefs.values()].sort((a, b) => b.shortDays - a.shortDays || a.doBefore - b.doBefore);
}
