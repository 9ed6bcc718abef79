import type { Transaction } from 'kysely';
import { findOutingsSince, findReadingsAround, type ReadingThen } from '@/db/queries/meter-at';
import type { LiveMeterRow } from '@/db/queries/units';
import type { DB } from '@/db/tables';
import type { Context } from '@/lib/context';
import { checkReading, formatTenths } from '@/lib/domain/meter';
import { describeMoment } from '@/lib/domain/moment-words';
import { Refusal, refuseField } from '@/lib/errors';
import { toTenths } from '@/lib/schemas/schedule-shape';
import type { CloseTask } from '@/lib/schemas/task';
import { refuseReading } from './refuse-reading';

/** Where the meters stood at a closing, and the reading it makes when it is above the live meter. */
export type ClosingMeter = {
  tenths: number;
  outings: number;
  reading: {
    unit_id: string;
    taken_at: Date;
    shown_tenths: number;
    base_tenths: number;
    review_code: 'unusual_jump' | null;
    confirm_reason: string | null;
  } | null;
};

type Closing = { live: LiveMeterRow; at: Date; timeZone: string; input: CloseTask };

/**
 * Engine hours and outings of the unit at the closing's instant. Hours not given are those of the last reading up to
 * then. Throws `unit_out` for an instant in the outing under way, `reading_refused` on `engineHours` for hours that do not
 * fit the readings before and after, `reason_needed` on `note` for a run that is unusual.
 */
export async function computeClosingMeter(
  ctx: Context,
  trx: Transaction<DB>,
  closing: Closing,
): Promise<ClosingMeter> {
  const { live, at, input } = closing;
  const outing = await findOutingsSince(trx, live.unit_id, at);
  if (outing.out && (outing.outSince === null || at >= outing.outSince))
    throw new Refusal('unit_out', 'The unit is out. Check it in first, then close the task.');
  const outings = live.outing_count - outing.ended;
  const { last, next } = await findReadings(trx, live, at);
  if (input.engineHours === undefined) {
    if (last === null)
      throw refuseField(
        'at',
        `is before the unit's first reading, of ${describeMoment((next ?? liveReading(live)).taken_at, closing.timeZone)}`,
      );
    return { tenths: last.engine_hours_tenths, outings, reading: null };
  }
  const tenths = toTenths(input.engineHours);
  const review = checkHours(ctx, closing, tenths, last, next);
  if (tenths <= live.engine_hours_tenths) return { tenths, outings, reading: null };
  const base = live.base_tenths;
  return {
    tenths,
    outings,
    reading: {
      unit_id: live.unit_id,
      taken_at: at,
      shown_tenths: tenths - base,
      base_tenths: base,
      review_code: review ? 'unusual_jump' : null,
      confirm_reason: review ? (input.note ?? null) : null,
    },
  };
}

/** The readings around an instant; the live meter stands in for a unit whose readings are all void. */
async function findReadings(trx: Transaction<DB>, live: LiveMeterRow, at: Date) {
  const around = await findReadingsAround(trx, live.unit_id, at);
  if (around.last || around.next) return around;
  const only = liveReading(live);
  return only.taken_at <= at ? { last: only, next: null } : { last: null, next: only };
}

function liveReading({ read_at, ...live }: LiveMeterRow): ReadingThen {
  return { ...live, taken_at: read_at };
}

/** Checks given hours against the readings around them, in engine hours. Answers whether a manager is to review it. */
function checkHours(
  ctx: Context,
  closing: Closing,
  tenths: number,
  last: ReadingThen | null,
  next: ReadingThen | null,
): boolean {
  const asReading = (reading: ReadingThen) => ({
    shownTenths: reading.engine_hours_tenths,
    at: reading.taken_at,
  });
  const verdict = checkReading(
    { shownTenths: tenths, at: closing.at },
    { now: ctx.now, last: last && asReading(last), next: next && asReading(next) },
  );
  if (verdict.kind === 'ok') return false;
  if (verdict.kind !== 'unusual') throw refuseReading(verdict, closing.timeZone, 'engineHours');
  if (closing.input.note) return true;
  const ran = `${formatTenths(verdict.ranTenths)} h since the last reading`;
  throw refuseField(
    'note',
    `${ran} is unusual. Read the meter again; if it is right, say why.`,
    'reason_needed',
  );
}
