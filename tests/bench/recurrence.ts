import * as rruleModule from 'rrule';
import { occurrencesBetween, parseRecurrence } from '@/lib/domain/recurrence';
import { atLeast, median, ms, timed, type Figure } from './figures';

const ROUNDS = 9;
const REPEATED = 2_000;

/** Node shows the package as a default export, bundlers by name. */
const { rrulestr } =
  'rrulestr' in rruleModule ? rruleModule : (rruleModule as { default: typeof rruleModule }).default;

function ours(): number {
  const parsed = parseRecurrence('FREQ=DAILY');
  if (!parsed.ok) throw new Error(parsed.reason);
  return occurrencesBetween(parsed.recurrence, '2010-01-01', '2026-06-01', '2026-06-30').length;
}

function theirs(): number {
  const midnight = (day: string) => new Date(`${day}T00:00:00Z`);
  const rule = rrulestr('FREQ=DAILY', { dtstart: midnight('2010-01-01') });
  return rule.between(midnight('2026-06-01'), midnight('2026-06-30'), true).length;
}

/** A window of 30 days of a daily rule begun in 2010, the text of the rule read each time on both sides. */
export async function measureRecurrence(): Promise<Figure[]> {
  if (ours() !== 30 || theirs() !== 30) throw new Error('a window of 30 days has 30 days');
  const rounds: { ours: number; theirs: number }[] = [];
  for (let round = 0; round < ROUNDS; round += 1) {
    rounds.push({
      theirs: await timed(theirs),
      ours: (await timed(() => Array.from({ length: REPEATED }, ours))) / REPEATED,
    });
  }
  return [
    atLeast(
      '30-day window of a daily rule begun in 2010, times faster than rrule.js',
      median(rounds.map((r) => r.theirs / r.ours)),
      20,
      `${(median(rounds.map((r) => r.ours)) * 1000).toFixed(0)} µs to ${ms(median(rounds.map((r) => r.theirs)))}`,
    ),
  ];
}
