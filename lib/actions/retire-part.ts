import { listKitsWith, listRulesWith, lockParts, updatePart } from '@/db/queries/parts';
import { listLevels } from '@/db/queries/stock';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { joinWords } from '@/lib/domain/words';
import { refuseField } from '@/lib/errors';
import type { Part } from '@/lib/schemas/part';
import { accessPart } from './access';
import { getPart } from './get-part';

/**
 * Takes a part or a kit out of use; its moves stay on record. Managers and mechanics of all docks. Throws `conflict`
 * on `id` when it is retired already, a rule in force or a kit names it, or some of it is still on a shelf.
 */
export async function retirePart(ctx: Context, id: string): Promise<Part> {
  await accessPart(ctx, id, 'part.write');
  await runTransaction(ctx.db, async (trx) => {
    const [row] = await lockParts(trx, [id]);
    if (row?.retired_at) throw refuseField('id', 'is retired already', 'conflict');
    const named = [...(await listRulesWith(trx, id)), ...(await listKitsWith(trx, id))];
    if (named.length > 0)
      throw refuseField('id', `is used by ${joinWords(named.map(({ name }) => `“${name}”`))}`, 'conflict');
    const left = (await listLevels(trx, { dockIds: 'all', partIds: [id] })).filter(
      (one) => one.on_hand !== 0,
    );
    if (left.length > 0)
      throw refuseField(
        'id',
        `still stands at ${joinWords(left.map((one) => `${one.on_hand} at ${one.dock_name}`))}: use it up, or count it to 0`,
        'conflict',
      );
    await updatePart(trx, id, { retired_at: ctx.now, retired_by: personIdOf(ctx.actor) });
  });
  return getPart(ctx, id);
}
