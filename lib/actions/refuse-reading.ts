import { checkReading, formatTenths, type MeterReading, type ReadingVerdict } from '@/lib/domain/meter';
import { describeMoment } from '@/lib/domain/moment-words';
import { Refusal, refuseField } from '@/lib/errors';

type Refused = Exclude<ReadingVerdict, { kind: 'ok' }>;

const ABSURD: Record<Extract<Refused, { kind: 'absurd' }>['why'], string> = {
  not_whole_tenths: 'Give hours with one decimal place, such as 312.4.',
  negative: 'Hours cannot be below 0.',
  beyond_meter: 'No meter shows more than 99,999.9 h.',
  in_future: 'This is in the future.',
};

/**
 * The refusal of a reading, in the dock's time. `path` is the field of the number. An unusual run is
 * `reason_needed` on `confirmReason`; what cannot be right is `reading_refused`.
 */
export function refuseReading(verdict: Refused, timeZone: string, path = 'hours'): Refusal {
  const when = (at: Date) => describeMoment(at, timeZone);
  switch (verdict.kind) {
    case 'absurd':
      return refuseField(verdict.why === 'in_future' ? 'at' : path, ABSURD[verdict.why], 'reading_refused');
    case 'lower':
      return refuseField(
        path,
        `The meter showed ${formatTenths(verdict.lastTenths)} h on ${when(verdict.lastAt)} and cannot show less since. ` +
          'Read it again; if a new meter was fitted, say that the meter was swapped.',
        'reading_refused',
      );
    case 'higher_than_next':
      return refuseField(
        path,
        `The meter showed ${formatTenths(verdict.nextTenths)} h later, on ${when(verdict.nextAt)}, so it cannot have shown more before.`,
        'reading_refused',
      );
    case 'more_than_clock':
      return refuseField(
        path,
        `That is ${formatTenths(verdict.ranTenths)} h more than on ${when(verdict.lastAt)}, ` +
          `but only ${formatTenths(verdict.elapsedTenths)} h have passed since. Read the meter again.`,
        'reading_refused',
      );
    case 'unusual':
      return refuseField(
        'confirmReason',
        `${describeUnusual(verdict)} Read the meter again; if it is right, say why.`,
        'reason_needed',
      );
  }
}

function describeUnusual({ ranTenths, over, usualTenths }: Extract<Refused, { kind: 'unusual' }>): string {
  const ran = `The engine would have run ${formatTenths(ranTenths)} h since the last reading,`;
  return over === 'outing'
    ? `${ran} and the outing lasted ${formatTenths(usualTenths)} h.`
    : `${ran} more than the usual ${formatTenths(usualTenths)} h at most.`;
}

/** Throws `reading_refused` when the meter cannot have run from this reading to the next in the time between. */
export function requireTimeUntil(
  reading: MeterReading,
  next: MeterReading | null,
  { now, timeZone, path }: { now: Date; timeZone: string; path: string },
): void {
  if (!next || checkReading(next, { now, last: reading }).kind !== 'more_than_clock') return;
  throw refuseField(
    path,
    `The meter showed ${formatTenths(next.shownTenths)} h on ${describeMoment(next.at, timeZone)}, ` +
      'more than the time between allows.',
    'reading_refused',
  );
}
