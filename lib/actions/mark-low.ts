import { lockShelves, updateLowAt } from '@/db/queries/stock';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { refuseField } from '@/lib/errors';
import type { Part } from '@/lib/schemas/part';
import type { MarkLow } from '@/lib/schemas/stock';
import { accessDock, accessPart } from './access';
import { getPart } from './get-part';

/**
 * Says from how many free ones on a part is low at a dock, or with null that it never is. Managers and mechanics of
 * the dock. Throws `not_found` on `id` or `dockId`, `forbidden` on `dockId`, `conflict` for a part that is retired.
 */
export async function markLow(ctx: Context, partId: string, { dockId, lowAt }: MarkLow): Promise<Part> {
  const part = await accessPart(ctx, partId, 'part.read');
  await accessDock(ctx, dockId, 'stock.write');
  if (part.retired_at) throw refuseField('id', 'is retired', 'conflict');
  await runTransaction(ctx.db, async (trx) => {
    await lockShelves(trx, [{ partId, dockId }]);
    await updateLowAt(trx, { partId, dockId }, lowAt);
  });
  return getPart(ctx, partId);
}
