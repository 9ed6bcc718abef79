import { insertProcedure, insertProcedureVersion } from '@/db/queries/procedures';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import type { CreateProcedure, Procedure } from '@/lib/schemas/procedure';
import { requireFleetWide } from './access';
import { checkFollowUps } from './check-follow-ups';
import { getProcedure } from './get-procedure';
import { refusingTaken } from './refusing-taken';
import { PROCEDURE_NAME } from './shape-procedure';

/**
 * Adds a procedure in its first version. Managers and mechanics of all docks.
 * Throws `conflict` on `name`, `invalid_input` on a step's `onFail.procedureId` that names nothing.
 */
export async function createProcedure(ctx: Context, input: CreateProcedure): Promise<Procedure> {
  requireFleetWide(ctx, 'procedure.write');
  return runTransaction(ctx.db, async (trx) => {
    const inside = { ...ctx, db: trx };
    await checkFollowUps(inside, input.steps);
    const { id } = await refusingTaken(PROCEDURE_NAME, () =>
      insertProcedure(trx, { name: input.name, kind: input.kind, created_at: ctx.now }),
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
