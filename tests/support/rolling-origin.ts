import { numberOfDay } from '@/lib/domain/calendar-day';
import { computePool, forecastUnit } from '@/lib/domain/forecast';
import { computePassage } from '@/lib/domain/forecast-passage';

/** Due points lie so many mean days of usage ahead. */
export const MEAN_DAYS = [25, 50, 100] as const;
/** What is not reached within these many days ahead counts as reached then, whoever forecasts it. */
const HORIZON_DAYS = 400;

/** One forecast against what came: days late (positive) or early, of each way to forecast; inside the range or not. */
export type Outcome = { ours: number; recent: number; lastYear: number; inside: boolean };

const always = Array<boolean>(HORIZON_DAYS).fill(true);

/**
 * Forecasts day by day: at each origin from index `begin` on, when a series will have come to a due point, from what
 * lies before the origin alone. Due points that the series does not reach are left out.
 */
export function rollOrigins(firstDay: string, amounts: readonly number[], begin: number, every = 1) {
  const outcomes = new Map<number, Outcome[]>(MEAN_DAYS.map((days) => [days, []]));
  const mean = amounts.reduce((sum, amount) => sum + amount, 0) / amounts.length;
  for (let origin = begin; origin < amounts.length; origin += every) {
    const past = amounts.slice(0, origin);
    const forecast = forecastFrom(firstDay, past);
    const [recent, lastYear] = [recentMean(past), sameDayLastYear(past)];
    for (const days of MEAN_DAYS) {
      const due = days * mean;
      const truth = daysTo(amounts.slice(origin), due);
      if (truth === null) continue;
      const { expected, earliest, latest } = forecast(due);
      outcomes.get(days)!.push({
        ours: expected - truth,
        recent: (daysTo(recent, due) ?? HORIZON_DAYS) - truth,
        lastYear: (daysTo(lastYear, due) ?? HORIZON_DAYS) - truth,
        inside: earliest <= truth && truth <= latest,
      });
    }
  }
  return outcomes;
}

/** Our forecast at the end of `past`: a due point's first passage as days ahead, the next day being 1. */
export function forecastFrom(firstDay: string, past: readonly number[]) {
  const from = numberOfDay(firstDay);
  const pool = computePool([{ unitId: 'all', from, amounts: past, open: past.map(() => true) }]);
  if (!pool) throw new RangeError('nothing to forecast from');
  const forecast = forecastUnit(pool, 'all', from + past.length, always);
  return (due: number) => {
    const passage = computePassage(forecast, due);
    const ahead = (day: string | null) =>
      day === null ? HORIZON_DAYS : numberOfDay(day) - forecast.from + 1;
    return {
      expected: ahead(passage.expectedOn),
      earliest: ahead(passage.earliestOn),
      latest: ahead(passage.latestOn),
    };
  };
}

/** "The last 28 days' mean", every day. */
function recentMean(past: readonly number[]): number[] {
  const recent = past.slice(-28);
  return always.map(() => recent.reduce((sum, amount) => sum + amount, 0) / recent.length);
}

/** "The same weekday and week last year": 364 days before, or twice that beyond a year. */
function sameDayLastYear(past: readonly number[]): number[] {
  return always.map((_, ahead) => {
    const back = 364 * (1 + Math.floor(ahead / 364));
    return past[past.length + ahead - back] ?? 0;
  });
}

function daysTo(amounts: readonly number[], due: number): number | null {
  let sum = 0;
  const index = amounts.findIndex((amount) => (sum += amount) >= due - 1e-9);
  return index < 0 ? null : index + 1;
}
