import { insertProcedure, insertProcedureVersion } from '@/db/queries/procedures';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { STARTER_PROCEDURES } from '@/lib/domain/starter/procedures';
import { requireFleetWide } from './access';

/** Gives a new operator the procedures that everybody begins with. In the caller's transaction. */
export async function addStarterProcedures(ctx: Context): Promise<void> {
  requireFleetWide(ctx, 'procedure.write');
  for (const { name, kind, steps } of STARTER_PROCEDURES) {
    const { id } = await insertProcedure(ctx.db, { name, kind, created_at: ctx.now });
    await insertProcedureVersion(ctx.db, {
      procedure_id: id,
      steps: JSON.stringify(steps),
      note: 'As shipped: to be checked against the makers’ manuals.',
      written_at: ctx.now,
      written_by: personIdOf(ctx.actor),
    });
  }
}
