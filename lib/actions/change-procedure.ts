import { insertProcedureVersion, lockProcedure, updateProcedure } from '@/db/queries/procedures';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { refuseField } from '@/lib/errors';
import type { ChangeProcedure, Procedure } from '@/lib/schemas/procedure';
import { accessProcedure, requireFleetWide } from './access';
import { checkFollowUps } from './check-follow-ups';
import { getProcedure } from './get-procedure';
import { refusingTaken } from './refusing-taken';
import { PROCEDURE_NAME } from './shape-procedure';

/**
 * Writes the next version of a procedure; earlier ones stay, and tasks that are open keep theirs. Managers and
 * mechanics of all docks. Throws `conflict` on `version` when another was written since, on `name`, and on `id` for a
 * retired one; `invalid_input` as `createProcedure`.
 */
export async function changeProcedure(ctx: Context, id: string, input: ChangeProcedure): Promise<Procedure> {
  requireFleetWide(ctx, 'procedure.write');
  return runTransaction(ctx.db, async (trx) => {
    const inside = { ...ctx, db: trx };
    await lockProcedure(trx, id);
    const before = await accessProcedure(inside, id, 'procedure.write');
    if (before.retired_at) throw refuseField('id', 'is retired', 'conflict');
    if (input.version !== undefined && input.version !== before.version)
      throw refuseField('version', `is not the latest: ${before.version} was written meanwhile`, 'conflict');
    await checkFollowUps(inside, input.steps);
    await refusingTaken(PROCEDURE_NAME, () =>
      updateProcedure(trx, id, { name: input.name, kind: input.kind }),
    );
    await insertProcedureVersion(trx, {
      procedure_id: id,
      steps: JSON.stringify(input.steps),
      note: input.note || null,
      written_at: ctx.now,
      written_by: personIdOf(ctx.actor),
    });
    return getProcedure(inside, id);
  });
}
