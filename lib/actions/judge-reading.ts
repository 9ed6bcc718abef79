import type { KeptMeter, NewReading } from '@/db/queries/keep-readings';
import type { MeterFacts } from '@/db/queries/meter-facts';
import { checkMeterSwap, checkReading, computeBaseTenths, type MeterSwap } from '@/lib/domain/meter';
import { describeMoment } from '@/lib/domain/moment-words';
import { refuseField } from '@/lib/errors';
import { refuseReading, requireTimeUntil } from './refuse-reading';

/** A reading as somebody gives it. */
export type Entry = {
  id: string;
  at: Date;
  shownTenths: number;
  swap: MeterSwap | null;
  confirmReason: string | null;
  outingFrom: Date | null;
};

/** A reading found right: what is to be kept, and where the live meter then stands. */
export type Judged = {
  readings: Pick<NewReading, 'id' | 'taken_at' | 'shown_tenths' | 'base_tenths' | 'source'>[];
  meter: Omit<KeptMeter, 'outing_count'>;
  ranTenths: number;
  review: 'unusual_jump' | 'late_arrival' | null;
};

/**
 * Holds a reading against its neighbours. One that arrives after a later reading was kept fits between the two and
 * leaves the live meter where it is. Throws `reading_refused` on the field that is wrong, `reason_needed` on
 * `confirmReason`.
 */
export function judgeReading(facts: MeterFacts, entry: Entry, now: Date): Judged {
  const { time_zone: zone } = facts;
  if (facts.last_at === null || facts.last_shown_tenths === null || facts.last_base_tenths === null)
    throw refuseField('at', 'This is before the first reading of the unit.', 'reading_refused');
  const last = { at: facts.last_at, shownTenths: facts.last_shown_tenths, base: facts.last_base_tenths };
  const late = facts.next_at !== null;
  if (late && entry.swap)
    throw refuseField(
      'meterSwap',
      `A later reading is kept, of ${describeMoment(facts.next_at!, zone)}. A meter is swapped at the last reading.`,
      'reading_refused',
    );
  const { ranTenths, unusual } = entry.swap
    ? judgeSwap(entry, entry.swap, last, zone, now)
    : judgeBetween(facts, entry, last, now);
  const base_tenths = entry.swap ? computeBaseTenths(last.base, entry.swap) : last.base;
  const kept = {
    id: entry.id,
    taken_at: entry.at,
    shown_tenths: entry.shownTenths,
    base_tenths,
    source: 'check_in' as const,
  };
  const { reading_id, read_at, shown_tenths } = facts;
  return {
    readings: entry.swap ? [...swapReadings(entry.at, entry.swap, last.base, base_tenths), kept] : [kept],
    meter: late
      ? { reading_id, read_at, shown_tenths, base_tenths: facts.base_tenths }
      : { reading_id: entry.id, read_at: entry.at, shown_tenths: entry.shownTenths, base_tenths },
    ranTenths,
    review: late ? 'late_arrival' : unusual ? 'unusual_jump' : null,
  };
}

type Last = { at: Date; shownTenths: number; base: number };

/** Against the reading before, and against the one after as the meter of the one before would have shown it. */
function judgeBetween(facts: MeterFacts, entry: Entry, last: Last, now: Date) {
  const reading = { at: entry.at, shownTenths: entry.shownTenths };
  const next =
    facts.next_at === null
      ? null
      : { at: facts.next_at, shownTenths: facts.next_engine_hours_tenths! - last.base };
  const verdict = checkReading(reading, { now, last, next, outingFrom: entry.outingFrom });
  const unusual = verdict.kind === 'unusual';
  if (verdict.kind !== 'ok' && !(unusual && entry.confirmReason))
    throw refuseReading(verdict, facts.time_zone);
  requireTimeUntil(reading, next, { now, timeZone: facts.time_zone, path: 'hours' });
  return { ranTenths: entry.shownTenths - last.shownTenths, unusual };
}

function judgeSwap(entry: Entry, swap: MeterSwap, last: Last, zone: string, now: Date) {
  const reading = { at: entry.at, shownTenths: entry.shownTenths };
  const verdict = checkMeterSwap(swap, reading, { now, last, outingFrom: entry.outingFrom });
  const unusual = verdict.kind === 'unusual';
  if (verdict.kind !== 'ok' && !(unusual && entry.confirmReason)) {
    const ofOldMeter = verdict.kind === 'lower' && swap.oldFinalTenths < last.shownTenths;
    throw refuseReading(verdict, zone, ofOldMeter ? 'meterSwap.oldFinal' : 'hours');
  }
  const ranTenths = swap.oldFinalTenths - last.shownTenths + entry.shownTenths - swap.newFirstTenths;
  return { ranTenths, unusual };
}

function swapReadings(at: Date, swap: MeterSwap, oldBase: number, newBase: number): Judged['readings'] {
  const both = { taken_at: at };
  return [
    {
      ...both,
      id: crypto.randomUUID(),
      shown_tenths: swap.oldFinalTenths,
      base_tenths: oldBase,
      source: 'swap_final',
    },
    {
      ...both,
      id: crypto.randomUUID(),
      shown_tenths: swap.newFirstTenths,
      base_tenths: newBase,
      source: 'swap_first',
    },
  ];
}
