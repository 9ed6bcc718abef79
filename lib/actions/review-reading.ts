import { reviewReading as markReviewed } from '@/db/queries/readings';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { refuseField } from '@/lib/errors';
import type { ReviewedReading, ReviewReading } from '@/lib/schemas/reading';
import { accessReading } from './access';

/**
 * Accepts a reading that was kept for the manager to look at. Managers of the dock only. Throws `not_found`,
 * `forbidden`, and `conflict` on `id` when it does not wait for it.
 */
export async function reviewReading(
  ctx: Context,
  id: string,
  input: ReviewReading,
): Promise<ReviewedReading> {
  const reading = await accessReading(ctx, id, 'reading.review');
  const reviewed = { at: ctx.now, by: personIdOf(ctx.actor), note: input.note || null };
  if (!(await markReviewed(ctx.db, reading.id, reviewed)))
    throw refuseField('id', 'This reading does not wait for a review.', 'conflict');
  return { id: reading.id, unitId: reading.unit_id, reviewedAt: ctx.now.toISOString(), note: reviewed.note };
}
