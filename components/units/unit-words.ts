import { hoursText } from '@/components/rules/due-words';
import type { HistoryKind } from '@/lib/schemas/history';
import type { Room } from '@/lib/schemas/fleet';

const counted = (count: number, one: string) => `${count} ${count === 1 ? one : `${one}s`}`;

/** What is left before the next hold by each measure, one a line; past it where a measure is used up. */
export function roomLines({ hoursToHold, outingsToHold, daysToHold }: Room): string[] {
  const line = (amount: number | null, words: (size: number) => string) =>
    amount === null ? [] : [`${words(Math.abs(amount))} ${amount < 0 ? 'past' : 'left'}`];
  return [
    ...line(hoursToHold, hoursText),
    ...line(outingsToHold, (size) => counted(size, 'outing')),
    ...line(daysToHold, (size) => counted(size, 'day')),
  ];
}

/** What carburettors a unit has, in words. */
export function carburettorText(count: number): string {
  return count === 0 ? 'none' : counted(count, 'carburettor');
}

export const HISTORY_WORDS: Record<HistoryKind, string> = {
  outing: 'Outings',
  reading: 'Readings',
  meter_swap: 'Meter swaps',
  closure: 'Closed tasks',
  defect: 'Defects',
  lay_up: 'Lay-ups',
};

/** Where a reading came from. */
export const SOURCE_WORDS = {
  entry: 'First reading',
  check_in: 'Reading at check-in',
  logged: 'Reading',
  swap_final: 'Old meter’s last reading',
  swap_first: 'New meter’s first reading',
  closure: 'Reading when a task was closed',
  correction: 'Corrected reading',
} as const;
