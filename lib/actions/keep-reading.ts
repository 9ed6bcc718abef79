import { keepReadings, type ReadingsToKeep } from '@/db/queries/keep-readings';
import type { MeterFacts } from '@/db/queries/meter-facts';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { FUTURE_TOLERANCE_MS } from '@/lib/domain/meter';
import { jobFragment } from '@/lib/enqueue';
import { Refusal, refuseField } from '@/lib/errors';
import type { CreateCheckIn } from '@/lib/schemas/check-in';
import { toTenths } from '@/lib/schemas/schedule-shape';
import { accessMeterFacts, type Checked } from './access';
import { judgeReading, type Judged } from './judge-reading';

/** How often an entry is judged anew because somebody else wrote on the unit between looking and keeping. */
const ATTEMPTS = 5;
/** A reading kept, or the earlier one of the same id found. */
export type Kept =
  | { found: Checked<MeterFacts>; written: null }
  | { found: null; written: { judged: Judged; plan: ReadingsToKeep; at: Date } };

/**
 * Judges an entry against the unit's facts and keeps it, with two round trips and one commit when nobody else is
 * writing on the unit. `source` 'check_in' ends the unit's open outing, or one whose start is unknown.
 * An entry of the same id for the same unit writes nothing.
 * Throws `conflict` on `id` when another entry has it or on `unitId` when the unit is retired, `forbidden`,
 * `not_found`, and what `judgeReading` throws.
 */
export async function keepReading(
  ctx: Context,
  input: CreateCheckIn,
  source: 'check_in' | 'logged',
): Promise<Kept> {
  const at = settleInstant(input.at, ctx.now);
  for (let attempt = 1; attempt <= ATTEMPTS; attempt += 1) {
    const facts = await accessMeterFacts(
      ctx,
      { unitId: input.unitId, at, readingId: input.id },
      'outing.write',
    );
    if (facts.kept_unit_id !== null) {
      if (facts.kept_unit_id !== input.unitId || facts.kept_source !== source)
        throw refuseField('id', 'Another entry has this id.', 'conflict');
      return { found: facts, written: null };
    }
    if (facts.retired_at) throw refuseField('unitId', 'The unit is retired.', 'conflict');
    const { judged, plan } = planReading(ctx, facts, input, at, source);
    if (await keepUnlessTaken(ctx, plan)) return { found: null, written: { judged, plan, at } };
  }
  throw new Refusal('conflict', 'Others are writing on this unit at the same moment. Send it again.');
}

/** The instant of an entry: now where none is given, and where a telephone's clock is a little fast. */
export function settleInstant(at: Date | undefined, now: Date): Date {
  if (!at) return now;
  const aheadMs = at.getTime() - now.getTime();
  return aheadMs > 0 && aheadMs <= FUTURE_TOLERANCE_MS ? now : at;
}

function planReading(
  ctx: Context,
  facts: MeterFacts,
  input: CreateCheckIn,
  at: Date,
  source: 'check_in' | 'logged',
): { judged: Judged; plan: ReadingsToKeep } {
  const ends = source === 'check_in';
  const started = facts.open_started_at;
  const open = ends && started !== null && started.getTime() - at.getTime() <= FUTURE_TOLERANCE_MS;
  const entry = {
    id: input.id,
    at,
    shownTenths: toTenths(input.hours),
    swap: input.meterSwap
      ? {
          oldFinalTenths: toTenths(input.meterSwap.oldFinal),
          newFirstTenths: toTenths(input.meterSwap.newFirst),
        }
      : null,
    confirmReason: input.confirmReason ?? null,
    outingFrom: open ? started : null,
  };
  const judged = judgeReading(facts, entry, ctx.now);
  const words = { confirm_reason: entry.confirmReason, review_code: judged.review };
  const { defect } = input;
  return {
    judged,
    plan: {
      unitId: facts.unit_id,
      dockId: facts.dock_id,
      revision: facts.revision,
      meter: { ...judged.meter, outing_count: facts.outing_count + (ends ? 1 : 0) },
      readings: judged.readings.map((reading) =>
        reading.id === input.id
          ? { ...reading, ...words, source }
          : { ...reading, confirm_reason: null, review_code: null },
      ),
      outing: ends
        ? {
            id: open ? facts.open_outing_id! : crypto.randomUUID(),
            open,
            endedAt: open && started > at ? started : at,
          }
        : null,
      defect: defect
        ? {
            id: crypto.randomUUID(),
            title: defect.title,
            detail: defect.detail || null,
            holds_unit: defect.holdsUnit,
            reading_id: input.id,
          }
        : null,
      recordedAt: ctx.now,
      recordedBy: personIdOf(ctx.actor),
      job: jobFragment('refresh-due', { unitIds: [facts.unit_id] }, { key: facts.unit_id }),
    },
  };
}

/** False also when an entry of the same id for another unit was kept in the meantime: looking again will tell. */
async function keepUnlessTaken(ctx: Context, plan: ReadingsToKeep): Promise<boolean> {
  try {
    return await keepReadings(ctx.db, plan);
  } catch (error) {
    const { code, constraint } = error as { code?: string; constraint?: string };
    if ((code === '23505' && constraint === 'reading_pkey') || code === '40001' || code === '40P01')
      return false;
    throw error;
  }
}
