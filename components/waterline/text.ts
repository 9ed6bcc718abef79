import { stateWords } from '@/components/state/state-words';
import { governingLimit, type WaterlineUnit } from './geometry';

/** Tenths of an hour without a sign: 124 is "12.4 h". */
export function hoursText(tenths: number): string {
  return `${(Math.abs(tenths) / 10).toFixed(1)} h`;
}

/** Days without a sign: "1 day", "9 days". */
export function daysText(days: number): string {
  return `${Math.abs(days)} ${Math.abs(days) === 1 ? 'day' : 'days'}`;
}

/** Outings without a sign: "1 outing", "21 outings". */
export function outingsText(outings: number): string {
  return `${Math.abs(outings)} ${Math.abs(outings) === 1 ? 'outing' : 'outings'}`;
}

/** The limit that comes soonest in a few letters: "12.4 h", "−3 d", "21×" of outings; a dash without a limit. */
export function shortAmount(unit: WaterlineUnit): string {
  return signedAmount(unit, {
    hours: hoursText,
    days: (days) => `${days} d`,
    outings: (count) => `${count}×`,
  });
}

/** As `shortAmount`, with outings written out: "21 outings". */
export function fullAmount(unit: WaterlineUnit): string {
  return signedAmount(unit, { hours: hoursText, days: (days) => `${days} d`, outings: outingsText });
}

function signedAmount(
  unit: WaterlineUnit,
  words: Record<'hours' | 'days' | 'outings', (size: number) => string>,
): string {
  const limit = governingLimit(unit);
  if (!limit) return '–';
  const amount = words[limit.by](Math.abs(limit.amount));
  return limit.amount < 0 ? `−${amount}` : amount;
}

/** What the picture says about the limits of one unit, in words: "12.4 h or 9 days left before its next hold". */
export function limitText(unit: WaterlineUnit): string {
  const { tenthsToHold: tenths, daysToHold: days, outingsToHold: outings = null } = unit;
  const measures = [
    { left: tenths, words: hoursText },
    { left: days, words: daysText },
    { left: outings, words: outingsText },
  ].flatMap(({ left, words }) => (left === null ? [] : [{ left, words: words(left) }]));
  const past = measures.filter(({ left }) => left < 0).map(({ words }) => words);
  if (past.length > 0) return `${past.join(' and ')} past its hold point`;
  if (measures.length === 0) return 'no hold ahead';
  const left = measures.map(({ words }) => words).join(' or ');
  return `${left} left before its next hold${measures.length > 1 ? ', whichever comes first' : ''}`;
}

/** One unit in a sentence: "JS-07, ready: 12.4 h left before its next hold". */
export function unitText(unit: WaterlineUnit): string {
  return `${unit.fleetNumber}, ${stateWords[unit.state].toLowerCase()}: ${limitText(unit)}`;
}
