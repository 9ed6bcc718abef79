import { type CalendarDay, dayOfNumber } from './calendar-day';
import type { UsageForecast } from './forecast';
import { normalChance } from './normal';

/**
 * When a meter will come to a due point: the expected day, and an 80 % range. Null is later than the forecast
 * reaches. A guess rests on the pool alone.
 */
export type Passage = {
  expectedOn: CalendarDay | null;
  earliestOn: CalendarDay | null;
  latestOn: CalendarDay | null;
  isGuess: boolean;
};

/** Standard normal quantile of 0.9: one in ten comes earlier than the range, one in ten later. */
const TENTH = 1.2815515655446004;

/**
 * First passage of the cumulated forecast through what is `left` (tenths of an hour, or outings; the forecast's own
 * measure): the first day by whose end the chance to have run as much is a tenth, a half and nine tenths. What will
 * have been run by a day is taken as lognormal about the forecast with its variance, so it is never below nothing. With
 * nothing left it is the first day of the forecast, whatever the day.
 */
export function computePassage(forecast: UsageForecast, left: number): Passage {
  const { from, sums, doubts, basis } = forecast;
  const found: (number | null)[] = [null, null, null];
  const bars = [-TENTH, 0, TENTH];
  for (let ahead = 0; ahead < sums.length && found[2] === null; ahead += 1) {
    const surety = left <= 0 ? Infinity : suretyOf(sums[ahead]!, doubts[ahead]!, left);
    bars.forEach((bar, index) => {
      if (found[index] === null && surety >= bar) found[index] = from + ahead;
    });
  }
  const [earliestOn, expectedOn, latestOn] = found.map((day) => (day === null ? null : dayOfNumber(day)));
  return { earliestOn: earliestOn!, expectedOn: expectedOn!, latestOn: latestOn!, isGuess: basis === 'pool' };
}

/** The standard normal quantile of the chance that at least `left` was run. */
function suretyOf(sum: number, doubt: number, left: number): number {
  if (sum <= 0) return -Infinity;
  const variance = Math.log1p(doubt);
  return Math.log(sum / left) / Math.sqrt(variance + 1e-12);
}

/** The chance that what is `left` will have been run by the end of each day of the forecast; it never falls. */
export function computeChances({ sums, doubts }: UsageForecast, left: number): Float64Array {
  let chance = 0;
  return sums.map((sum, ahead) => {
    chance = Math.max(chance, left <= 0 ? 1 : normalChance(suretyOf(sum, doubts[ahead]!, left)));
    return chance;
  });
}
