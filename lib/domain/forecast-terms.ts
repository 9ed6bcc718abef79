/**
 * What the rhythm of a pool is made of: a level that moves, the weekday, the season of the year and growth. Each is
 * a term of the logarithm of the amount that one unit runs on an open day.
 */
import { weekdayIndex } from './calendar-day';
import { type Symmetric, zeroMatrix } from './cholesky';

/** Waves of the season: once and twice a year. */
const WAVES = 2;
const YEAR_DAYS = 365.25;
/** The season speaks once it was seen whole, give or take a month; growth cannot be told from it before. */
const WHOLE_YEAR_DAYS = 330;
/** The level is a line between points this far apart, the last of them on the last day. */
const LEVEL_DAYS = 28;
/** How fast growth wears off: after so many days it goes on at 1/e of its pace. */
const GROWTH_LASTS_DAYS = 180;

/** How far each term is expected from none, as a standard deviation of the logarithm. */
const SPREAD = { weekday: 0.5, season: 1, growthPerYear: 0.3, level: 0.07, levelWithoutSeason: 0.25 };

/** Which terms there are, and where each stands in the list of coefficients. */
export type Terms = {
  lastDay: number;
  withSeason: boolean;
  levels: number;
  firstLevel: number;
  size: number;
  /** How far the level moves in one day, as a standard deviation of the logarithm. */
  levelSpreadPerDay: number;
};

/** The terms for days from `firstDay` to `lastDay`, day numbers both. */
export function chooseTerms(firstDay: number, lastDay: number): Terms {
  const withSeason = lastDay - firstDay + 1 >= WHOLE_YEAR_DAYS;
  const levels = Math.max(1, Math.ceil((lastDay - firstDay) / LEVEL_DAYS)) + 1;
  const firstLevel = withSeason ? 7 + 2 * WAVES + 1 : 7;
  const perStep = withSeason ? SPREAD.level : SPREAD.levelWithoutSeason;
  const levelSpreadPerDay = perStep / Math.sqrt(LEVEL_DAYS);
  return { lastDay, withSeason, levels, firstLevel, size: firstLevel + levels, levelSpreadPerDay };
}

/** The terms of one day that are not zero: their places and values. */
export type Row = { places: number[]; values: number[] };

/** The row of a day number; after the last day the level stays where it is and growth wears off. */
export function rowOf(terms: Terms, day: number): Row {
  const { lastDay, firstLevel, levels } = terms;
  const row: Row = { places: [weekdayIndex(day)], values: [1] };
  const add = (place: number, value: number) => {
    row.places.push(place);
    row.values.push(value);
  };
  if (terms.withSeason) {
    for (let wave = 1; wave <= WAVES; wave += 1) {
      const angle = (2 * Math.PI * wave * day) / YEAR_DAYS;
      add(5 + 2 * wave, Math.cos(angle));
      add(6 + 2 * wave, Math.sin(angle));
    }
    add(7 + 2 * WAVES, growthAt(day - lastDay));
  }
  const back = Math.min(levels - 1, Math.max(0, (lastDay - day) / LEVEL_DAYS));
  const later = Math.min(levels - 2, Math.floor(back));
  add(firstLevel + levels - 1 - later, 1 - (back - later));
  add(firstLevel + levels - 2 - later, back - later);
  return row;
}

/** Years of growth that a day has, counted from the last day (E. S. Gardner and E. McKenzie 1985: damped trend). */
function growthAt(days: number): number {
  const lasting = days <= 0 ? days : GROWTH_LASTS_DAYS * (1 - Math.exp(-days / GROWTH_LASTS_DAYS));
  return lasting / YEAR_DAYS;
}

/** The matrix of the penalty that keeps each term near none, and each level near the one before. */
export function penaltyOf(terms: Terms): Symmetric {
  const penalty = zeroMatrix(terms.size);
  const hold = (place: number, spread: number) => {
    penalty[place]![place]! += 1 / spread ** 2;
  };
  for (let weekday = 0; weekday < 7; weekday += 1) hold(weekday, SPREAD.weekday);
  if (terms.withSeason) {
    for (let wave = 1; wave <= WAVES; wave += 1) {
      hold(5 + 2 * wave, SPREAD.season / wave ** 2);
      hold(6 + 2 * wave, SPREAD.season / wave ** 2);
    }
    hold(7 + 2 * WAVES, SPREAD.growthPerYear);
  }
  const step = 1 / (terms.levelSpreadPerDay ** 2 * LEVEL_DAYS);
  for (let place = terms.firstLevel; place < terms.size; place += 1) {
    hold(place, 1000);
    if (place === terms.firstLevel) continue;
    penalty[place]![place]! += step;
    penalty[place - 1]![place - 1]! += step;
    penalty[place]![place - 1]! -= step;
  }
  return penalty;
}
