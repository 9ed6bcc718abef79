/** Exponential smoothing, for demand that comes now and then. */

/**
 * Single smoothing: after each value the forecast of the next, the first forecast being the first value:
 * S₂ = y₁, then S(t) = α y(t−1) + (1 − α) S(t−1) (NIST/SEMATECH e-Handbook 6.4.3.1). As many forecasts as values.
 */
export function smooth(values: readonly number[], alpha: number): number[] {
  let forecast = values[0] ?? 0;
  return values.map((value) => (forecast = alpha * value + (1 - alpha) * forecast));
}

/**
 * Demand a period of a part that is wanted now and then: sizes and the periods between them are smoothed apart
 * (J. D. Croston 1972, begun with the first size and the first interval), which forecasts a little too much;
 * `corrected` is A. A. Syntetos and J. E. Boylan's (2005) 1 − α/2 of it. Null when nothing was ever wanted.
 */
export function computeIntermittentDemand(
  perPeriod: readonly number[],
  alpha = 0.1,
): { croston: number; corrected: number } | null {
  const sizes: number[] = [];
  const intervals: number[] = [];
  let since = 0;
  for (const demand of perPeriod) {
    since += 1;
    if (demand <= 0) continue;
    sizes.push(demand);
    intervals.push(since);
    since = 0;
  }
  const [size, interval] = [smooth(sizes, alpha).at(-1), smooth(intervals, alpha).at(-1)];
  if (size === undefined || interval === undefined) return null;
  return { croston: size / interval, corrected: ((1 - alpha / 2) * size) / interval };
}
