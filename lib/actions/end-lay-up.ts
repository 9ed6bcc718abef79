import { endLayUp as markEnded, findLayUp } from '@/db/queries/lay-ups';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { refuseField } from '@/lib/errors';
import type { LayUp } from '@/lib/schemas/lay-up';
import { accessLayUp } from './access';
import { toLayUp } from './shape-lay-up';

/**
 * Brings a laid-up unit back into service. Managers and mechanics of the dock. Throws `not_found`, `forbidden`, and
 * `conflict` on `id` when the lay-up has ended already.
 */
export async function endLayUp(ctx: Context, id: string): Promise<LayUp> {
  const layUp = await accessLayUp(ctx, id, 'lay-up.write');
  if (!(await markEnded(ctx.db, layUp.id, { at: ctx.now, by: personIdOf(ctx.actor) })))
    throw refuseField('id', 'This lay-up has ended already.', 'conflict');
  return toLayUp((await findLayUp(ctx.db, layUp.id))!);
}
