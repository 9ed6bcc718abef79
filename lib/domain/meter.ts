/**
 * Engine-hour meters. Every amount is in whole tenths of an hour, as such meters count.
 *
 * A unit's engine hours are what its meter shows plus what earlier meters ran (`baseTenths`).
 */

/** What a meter showed at an instant. */
export type MeterReading = { shownTenths: number; at: Date };

/** The highest a reading may be: 99,999.9 h, more than eleven years without a stop. */
export const MAX_METER_TENTHS = 999_999;
/**
 * How much more than the clock a meter may have run between two readings. Each reading is cut to a tenth,
 * which makes up to one tenth between two; the other is for clocks of two telephones that differ.
 */
export const CLOCK_TOLERANCE_TENTHS = 2;
/** More than this since the last reading is unusual for a hire craft, whatever the clock allows: 8.0 h. */
export const UNUSUAL_RUN_TENTHS = 80;
/** How far ahead of now a reading may claim to be: telephones' clocks differ. */
export const FUTURE_TOLERANCE_MS = 5 * 60_000;

const MS_PER_TENTH = 360_000;

export type ReadingVerdict =
  | { kind: 'ok'; ranTenths: number }
  | { kind: 'lower'; lastTenths: number; lastAt: Date }
  | { kind: 'higher_than_next'; nextTenths: number; nextAt: Date }
  | { kind: 'more_than_clock'; ranTenths: number; elapsedTenths: number; lastAt: Date }
  | { kind: 'unusual'; ranTenths: number; over: 'outing' | 'limit'; usualTenths: number }
  | { kind: 'absurd'; why: 'not_whole_tenths' | 'negative' | 'beyond_meter' | 'in_future' };

/** What a reading is held against. `last` and `next` are its neighbours in time, on the same meter. */
export type ReadingContext = {
  now: Date;
  last: MeterReading | null;
  next?: MeterReading | null;
  /** When the outing it ends began, where that is known. */
  outingFrom?: Date | null;
  /** The run that is unusual for this unit, if not UNUSUAL_RUN_TENTHS. */
  unusualTenths?: number;
};

/** Tenths of an hour the clock has run from one instant to another, begun tenths counted whole. */
export function elapsedTenths(from: Date, to: Date): number {
  return Math.max(0, Math.ceil((to.getTime() - from.getTime()) / MS_PER_TENTH));
}

function findAbsurd({ shownTenths, at }: MeterReading, now: Date): ReadingVerdict | null {
  if (!Number.isInteger(shownTenths)) return { kind: 'absurd', why: 'not_whole_tenths' };
  if (shownTenths < 0) return { kind: 'absurd', why: 'negative' };
  if (shownTenths > MAX_METER_TENTHS) return { kind: 'absurd', why: 'beyond_meter' };
  const ahead = at.getTime() - now.getTime();
  return ahead > FUTURE_TOLERANCE_MS ? { kind: 'absurd', why: 'in_future' } : null;
}

/** Whether a run since the last reading fits the clock, then whether it is unusual. */
function checkRun(ranTenths: number, at: Date, last: MeterReading, context: ReadingContext): ReadingVerdict {
  const { outingFrom, unusualTenths = UNUSUAL_RUN_TENTHS } = context;
  const elapsed = elapsedTenths(last.at, at);
  if (ranTenths > elapsed + CLOCK_TOLERANCE_TENTHS) {
    return { kind: 'more_than_clock', ranTenths, elapsedTenths: elapsed, lastAt: last.at };
  }
  const outing = outingFrom ? elapsedTenths(outingFrom, at) : null;
  if (outing !== null && ranTenths > outing + CLOCK_TOLERANCE_TENTHS) {
    return { kind: 'unusual', ranTenths, over: 'outing', usualTenths: outing };
  }
  return ranTenths > unusualTenths
    ? { kind: 'unusual', ranTenths, over: 'limit', usualTenths: unusualTenths }
    : { kind: 'ok', ranTenths };
}

/**
 * Checks a reading against its neighbours. In this order: absurd by itself; lower than the last; higher than
 * one already taken later; run longer than the clock allows (> elapsed + CLOCK_TOLERANCE_TENTHS); unusual,
 * which a reason can confirm: run longer than the outing lasted, by more than the same tolerance, or more
 * than the limit since the last reading. A first reading has run nothing.
 */
export function checkReading(reading: MeterReading, context: ReadingContext): ReadingVerdict {
  const { now, last, next } = context;
  const { shownTenths, at } = reading;
  const absurd = findAbsurd(reading, now);
  if (absurd) return absurd;
  if (last && shownTenths < last.shownTenths) {
    return { kind: 'lower', lastTenths: last.shownTenths, lastAt: last.at };
  }
  if (next && shownTenths > next.shownTenths) {
    return { kind: 'higher_than_next', nextTenths: next.shownTenths, nextAt: next.at };
  }
  return last ? checkRun(shownTenths - last.shownTenths, at, last, context) : { kind: 'ok', ranTenths: 0 };
}

/** Engine hours of a unit: what its meter shows and what earlier meters ran. */
export function computeEngineHours(shownTenths: number, baseTenths: number): number {
  return shownTenths + baseTenths;
}

/** A new meter: what the old one showed at the end, what the new one showed at first. */
export type MeterSwap = { oldFinalTenths: number; newFirstTenths: number };

/**
 * The base once a meter is swapped, so that engine hours go on unbroken: at the swap,
 * the new first reading and the new carried hours make the same engine hours as the old final reading and
 * the old base. Negative when a used meter is fitted that shows more than the unit has run.
 */
export function computeBaseTenths(baseTenths: number, swap: MeterSwap): number {
  return baseTenths + swap.oldFinalTenths - swap.newFirstTenths;
}

/**
 * Checks a swap, and the reading on the new meter that came with it. The old final reading is checked as any
 * reading is; the new meter may not show less than at first; and both runs together are held against the
 * clock and the outing.
 */
export function checkMeterSwap(
  swap: MeterSwap,
  reading: MeterReading,
  context: Omit<ReadingContext, 'next'>,
): ReadingVerdict {
  const { now, last } = context;
  const { oldFinalTenths, newFirstTenths } = swap;
  const { shownTenths, at } = reading;
  const absurd = [oldFinalTenths, newFirstTenths, shownTenths]
    .map((tenths) => findAbsurd({ shownTenths: tenths, at }, now))
    .find((verdict) => verdict !== null);
  if (absurd) return absurd;
  if (last && oldFinalTenths < last.shownTenths) {
    return { kind: 'lower', lastTenths: last.shownTenths, lastAt: last.at };
  }
  if (shownTenths < newFirstTenths) return { kind: 'lower', lastTenths: newFirstTenths, lastAt: at };
  const onNew = shownTenths - newFirstTenths;
  return last
    ? checkRun(oldFinalTenths - last.shownTenths + onNew, at, last, context)
    : { kind: 'ok', ranTenths: onNew };
}

/** Tenths as decimal hours with one place: 14727 is '1472.7'. */
export function formatTenths(tenths: number): string {
  return (tenths / 10).toFixed(1);
}

export type ParsedHours = { ok: true; tenths: number } | { ok: false; reason: string };

/**
 * Decimal hours as tenths: '1472.7', 1472.7 and '1472' are read; a second place, a comma, a sign, an exponent
 * and what no meter can show are refused with a sentence that says why.
 */
export function parseHoursToTenths(hours: string | number): ParsedHours {
  const text = String(hours).trim();
  if (/^-/.test(text)) return { ok: false, reason: 'Hours cannot be negative.' };
  if (/^\d+\.\d{2,}$/.test(text))
    return { ok: false, reason: 'Hours take one decimal place, such as 1472.7.' };
  if (!/^\d+(\.\d)?$/.test(text)) return { ok: false, reason: 'Hours must be a number such as 1472.7.' };
  const tenths = Math.round(Number(text) * 10);
  return tenths <= MAX_METER_TENTHS
    ? { ok: true, tenths }
    : { ok: false, reason: `Hours cannot be more than ${formatTenths(MAX_METER_TENTHS)}.` };
}
