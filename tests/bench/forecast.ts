import { addDays, numberOfDay, WEEKDAYS } from '@/lib/domain/calendar-day';
import { computePool, forecastUnit, toUnitDays } from '@/lib/domain/forecast';
import { computePassage } from '@/lib/domain/forecast-passage';
import { computeDailyUsage, computeOpenDays, type UsageFacts } from '@/lib/domain/usage';
import { dice } from '../support/simulated-hires';
import { median, ms, type Figure } from './figures';

const ROUNDS = 5;
const FROM = '2024-11-01';
const TODAY = '2026-11-01';
const PAST_DAYS = 730;
const AHEAD_DAYS = 400;
const UNITS_IN_POOL = 8;
const opening = { season: { from: '03-15', to: '10-31' }, openWeekdays: WEEKDAYS };

/** Two years of a unit: hired on half of its days, more at weekends, for some two hours. */
function makeFacts(seed: number): UsageFacts {
  const { uniform } = dice(seed);
  let engineHoursTenths = 0;
  const readings = [{ on: FROM, engineHoursTenths }];
  const outings: string[] = [];
  for (let day = 1; day < PAST_DAYS; day += 1) {
    if (uniform() > (day % 7 < 2 ? 0.7 : 0.4)) continue;
    const on = addDays(FROM, day);
    engineHoursTenths += Math.round(10 + 25 * uniform());
    readings.push({ on, engineHoursTenths });
    outings.push(on);
  }
  return { readings, outings, layUps: [], opening, today: TODAY };
}

/** From readings to an expected day and range of each meter due point, by hours and by outings. */
function forecastFleet(fleet: readonly UsageFacts[], rules: number): number {
  const from = numberOfDay(TODAY);
  const open = computeOpenDays({ opening, layUps: [] }, from, AHEAD_DAYS);
  let dated = 0;
  for (let first = 0; first < fleet.length; first += UNITS_IN_POOL) {
    const usages = fleet.slice(first, first + UNITS_IN_POOL).map((facts) => computeDailyUsage(facts)!);
    for (const measure of ['tenths', 'outings'] as const) {
      const pool = computePool(usages.map((usage, index) => toUnitDays(`${index}`, usage, measure)))!;
      usages.forEach((_, index) => {
        const forecast = forecastUnit(pool, `${index}`, from, open);
        for (let rule = 1; rule <= rules; rule += 1) {
          const { expectedOn } = computePassage(forecast, rule * (measure === 'tenths' ? 200 : 10));
          if (expectedOn) dated += 1;
        }
      });
    }
  }
  return dated;
}

function measureFleet(units: number, rules: number, seconds: number): Figure {
  const fleet = Array.from({ length: units }, (_, seed) => makeFacts(seed + 1));
  const rounds = Array.from({ length: ROUNDS }, () => {
    const before = process.cpuUsage();
    if (forecastFleet(fleet, rules) < units * rules) throw new Error('due points went without a day');
    const { user, system } = process.cpuUsage(before);
    return (user + system) / 1000;
  });
  return {
    what: `forecast of ${units.toLocaleString('en')} units under ${rules} rules from two years of readings, processor time`,
    measured: ms(median(rounds)),
    target: `< ${seconds} s`,
    reached: median(rounds) < seconds * 1000,
  };
}

/** Each unit's forecasts, hours and outings, made anew from its readings; the simulated fleet has pools of eight. */
export async function measureForecast(): Promise<Figure[]> {
  return [measureFleet(46, 12, 1), measureFleet(2_000, 12, 10)];
}
