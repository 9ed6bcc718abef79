import { getCheckIn } from '@/db/queries/check-ins';
import type { Context } from '@/lib/context';
import type { CheckIn, CreateCheckIn } from '@/lib/schemas/check-in';
import { toHours } from '@/lib/schemas/schedule-shape';
import { keepReading } from './keep-reading';

/**
 * Takes a unit back: keeps the reading, ends the outing, and what else came with it (a new meter, a defect).
 * Without an open outing it counts one whose start is unknown. The id is the caller's: sending it again answers
 * with the first result and writes nothing. Refuses as `keepReading` does.
 */
export async function checkIn(ctx: Context, input: CreateCheckIn): Promise<CheckIn> {
  const { written } = await keepReading(ctx, input, 'check_in');
  if (!written) return answerAgain(ctx, input.id);
  const { judged, plan, at } = written;
  const kept = plan.readings.at(-1)!;
  return {
    id: kept.id,
    unitId: plan.unitId,
    engineHours: toHours(kept.base_tenths + kept.shown_tenths),
    shownHours: toHours(kept.shown_tenths),
    hoursRun: toHours(judged.ranTenths),
    outings: plan.meter.outing_count,
    outingId: plan.outing!.id,
    at: at.toISOString(),
    defectId: plan.defect?.id ?? null,
    review: judged.review,
  };
}

async function answerAgain(ctx: Context, id: string): Promise<CheckIn> {
  const row = await getCheckIn(ctx.db, id);
  return {
    id,
    unitId: row.unit_id,
    engineHours: toHours(row.engine_hours_tenths),
    shownHours: toHours(row.shown_tenths),
    hoursRun: toHours(row.ran_tenths),
    outings: row.outings,
    outingId: row.outing_id,
    at: row.taken_at.toISOString(),
    defectId: row.defect_id,
    review: row.review_code,
  };
}
