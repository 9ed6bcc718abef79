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

/** The limit that comes sooner in a few letters: "12.4 h", "−3 d"; a dash without a limit. */
export function shortAmount(unit: WaterlineUnit): string {
  const limit = governingLimit(unit);
  if (!limit) return '–';
  const amount = limit.by === 'hours' ? hoursText(limit.amount) : `${Math.abs(limit.amount)} d`;
  return limit.amount < 0 ? `−${amount}` : amount;
}

/** What the picture says about the limits of one unit, in words: "12.4 h or 9 days left before its next hold". */
export function limitText(unit: WaterlineUnit): string {
  const { tenthsToHold: tenths, daysToHold: days } = unit;
  const past = [
    tenths !== null && tenths < 0 ? hoursText(tenths) : null,
    days !== null && days < 0 ? daysText(days) : null,
  ].filter(Boolean);
  if (past.length > 0) return `${past.join(' and ')} past its hold point`;
  const left = [tenths === null ? null : hoursText(tenths), days === null ? null : daysText(days)].filter(
    Boolean,
  );
  if (left.length === 0) return 'no hold ahead';
  return `${left.join(' or ')} left before its next hold${left.length > 1 ? ', whichever comes first' : ''}`;
}

/** One unit in a sentence: "JS-07, ready: 12.4 h left before its next hold". */
export function unitText(unit: WaterlineUnit): string {
  return `${unit.fleetNumber}, ${stateWords[unit.state].toLowerCase()}: ${limitText(unit)}`;
}
