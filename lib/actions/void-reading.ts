import type { Transaction } from 'kysely';
import { findMeterFacts, type MeterFacts } from '@/db/queries/meter-facts';
import { voidOuting } from '@/db/queries/outings';
import {
  findReading,
  insertReading,
  listReadingsFrom,
  recountLiveMeter,
  voidReadings,
  type ReadingRow,
} from '@/db/queries/readings';
import { getUnit, lockUnits } from '@/db/queries/units';
import type { DB } from '@/db/tables';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { checkReading, formatTenths } from '@/lib/domain/meter';
import { describeMoment } from '@/lib/domain/moment-words';
import { refuseField } from '@/lib/errors';
import type { VoidedReading, VoidReading } from '@/lib/schemas/reading';
import { toHours, toTenths } from '@/lib/schemas/schedule-shape';
import { accessReading } from './access';
import { enqueueRefresh } from './assess-again';
import { refuseReading, requireTimeUntil } from './refuse-reading';

/**
 * Voids a reading with a reason and, when told, puts another in its place and voids the outing it ended; then counts
 * the live meter from what is left. Both readings are kept. Managers and mechanics of the dock.
 * The two readings of a meter swap are voided together, by either's id, once no reading on the new meter is left;
 * the right one is then logged anew.
 * Throws `not_found`, `forbidden`, `conflict` on `id`, `invalid_input` on `replacement` or `outingHappened`, and
 * `reading_refused` on `replacement.hours` when it does not fit between its neighbours.
 */
export async function voidReading(ctx: Context, id: string, input: VoidReading): Promise<VoidedReading> {
  const reading = await accessReading(ctx, id, 'reading.void');
  const voided = { at: ctx.now, by: personIdOf(ctx.actor), reason: input.reason };
  return runTransaction(ctx.db, async (trx) => {
    await lockUnits(trx, [reading.unit_id]);
    const now = await findReading(trx, reading.id);
    if (now?.voided_at) throw refuseField('id', 'This reading is void already.', 'conflict');
    await voidReadings(trx, await chooseReadings(trx, reading, input), voided);
    if (input.outingHappened === false) {
      if (!reading.outing_id) throw refuseField('outingHappened', 'No outing ended with this reading.');
      await voidOuting(trx, reading.outing_id, voided);
    }
    const facts = await getFactsAround(trx, reading);
    if (!input.replacement && facts.last_at === null)
      throw refuseField('replacement', 'This is the unit’s first reading: say what it should have been.');
    const replacementId = input.replacement
      ? await replace(trx, ctx, reading, facts, toTenths(input.replacement.hours))
      : null;
    await recountLiveMeter(trx, reading.unit_id);
    await enqueueRefresh(trx, [reading.unit_id]);
    const unit = await getUnit(trx, reading.unit_id);
    return {
      id: reading.id,
      unitId: unit.id,
      voidedAt: ctx.now.toISOString(),
      replacementId,
      engineHours: toHours(unit.engine_hours_tenths),
      outings: unit.outing_count,
    };
  });
}

/** The readings that are void with this one. */
async function chooseReadings(
  trx: Transaction<DB>,
  reading: ReadingRow,
  input: VoidReading,
): Promise<string[]> {
  if (reading.source === 'swap_final' || reading.source === 'swap_first')
    return chooseSwap(trx, reading, input);
  return [reading.id];
}

async function chooseSwap(trx: Transaction<DB>, reading: ReadingRow, input: VoidReading): Promise<string[]> {
  if (input.replacement)
    throw refuseField('replacement', 'Void the meter swap, then log the reading with the right one.');
  const since = await listReadingsFrom(trx, reading.unit_id, reading.taken_at);
  const ofSwap = (other: (typeof since)[number]) =>
    (other.source === 'swap_final' || other.source === 'swap_first') &&
    other.taken_at.getTime() === reading.taken_at.getTime();
  const later = since.find((other) => !ofSwap(other));
  if (later)
    throw refuseField(
      'id',
      `The new meter was read: ${formatTenths(later.shown_tenths)} h on ${describeMoment(later.taken_at, reading.time_zone)}. ` +
        'Void that reading first.',
      'conflict',
    );
  return since.map((other) => other.id);
}

async function getFactsAround(trx: Transaction<DB>, reading: ReadingRow): Promise<MeterFacts> {
  const asked = { unitId: reading.unit_id, at: reading.taken_at, readingId: reading.id };
  return (await findMeterFacts(trx, asked))!;
}

/** Keeps the right value at the instant of the void one, if it fits between its neighbours. */
async function replace(
  trx: Transaction<DB>,
  ctx: Context,
  reading: ReadingRow,
  facts: MeterFacts,
  shownTenths: number,
): Promise<string> {
  const { taken_at: at, base_tenths: base, unit_id: unitId, time_zone: zone } = reading;
  const last =
    facts.last_at === null
      ? null
      : { at: facts.last_at, shownTenths: facts.last_shown_tenths! + facts.last_base_tenths! - base };
  const next =
    facts.next_at === null
      ? null
      : { at: facts.next_at, shownTenths: facts.next_engine_hours_tenths! - base };
  const verdict = checkReading({ at, shownTenths }, { now: ctx.now, last, next });
  if (verdict.kind !== 'ok' && verdict.kind !== 'unusual')
    throw refuseReading(verdict, zone, 'replacement.hours');
  requireTimeUntil({ at, shownTenths }, next, { now: ctx.now, timeZone: zone, path: 'replacement.hours' });
  const { id } = await insertReading(trx, {
    unit_id: unitId,
    taken_at: at,
    shown_tenths: shownTenths,
    base_tenths: base,
    source: 'correction',
    outing_id: reading.outing_id,
    recorded_at: ctx.now,
    recorded_by: personIdOf(ctx.actor),
    replaces_reading_id: reading.id,
  });
  return id;
}
