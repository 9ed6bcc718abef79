import { lockProcedure, updateProcedure } from '@/db/queries/procedures';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { countOf, joinWords } from '@/lib/domain/words';
import { refuseField } from '@/lib/errors';
import type { Procedure } from '@/lib/schemas/procedure';
import { accessProcedure, requireFleetWide } from './access';
import { getProcedure } from './get-procedure';

/**
 * Takes a procedure out of use; its versions stay with the tasks that keep them. Managers and mechanics of all docks.
 * Throws `conflict` on `id` when it is retired already or a rule in force still names it.
 */
export async function retireProcedure(ctx: Context, id: string): Promise<Procedure> {
  requireFleetWide(ctx, 'procedure.write');
  return runTransaction(ctx.db, async (trx) => {
    const inside = { ...ctx, db: trx };
    await lockProcedure(trx, id);
    const { retired_at, rule_names: rules } = await accessProcedure(inside, id, 'procedure.write');
    if (retired_at) throw refuseField('id', 'is retired already', 'conflict');
    if (rules.length > 0)
      throw refuseField('id', `is used by ${countOf(rules.length, 'rule')}: ${joinWords(rules)}`, 'conflict');
    await updateProcedure(trx, id, { retired_at: ctx.now, retired_by: personIdOf(ctx.actor) });
    return getProcedure(inside, id);
  });
}
