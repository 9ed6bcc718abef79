import type { Context } from '@/lib/context';
import type { CreateReading, KeptReading } from '@/lib/schemas/reading';
import { toHours } from '@/lib/schemas/schedule-shape';
import { getCheckIn } from '@/db/queries/check-ins';
import { keepReading } from './keep-reading';

/**
 * Keeps what a unit's meter shows without an outing: after a test run, or when a new meter was fitted. The id is the
 * caller's: sending it again answers with the first result and writes nothing. Refuses as `keepReading` does.
 */
export async function logReading(ctx: Context, input: CreateReading): Promise<KeptReading> {
  const { written } = await keepReading(ctx, input, 'logged');
  if (!written) {
    const row = await getCheckIn(ctx.db, input.id);
    return {
      id: input.id,
      unitId: row.unit_id,
      engineHours: toHours(row.engine_hours_tenths),
      shownHours: toHours(row.shown_tenths),
      hoursRun: toHours(row.ran_tenths),
      at: row.taken_at.toISOString(),
      review: row.review_code,
    };
  }
  const kept = written.plan.readings.at(-1)!;
  return {
    id: kept.id,
    unitId: written.plan.unitId,
    engineHours: toHours(kept.base_tenths + kept.shown_tenths),
    shownHours: toHours(kept.shown_tenths),
    hoursRun: toHours(written.judged.ranTenths),
    at: written.at.toISOString(),
    review: written.judged.review,
  };
}
