import { insertProcedure, insertProcedureVersion } from '@/db/queries/procedures';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { STARTER_PROCEDURES } from '@/lib/domain/starter/procedures';
import { requireFleetWide } from './access';

/** Gives a new operator the procedures that everybody begins with. In the caller's transaction. */
export async function addStarterProcedures(ctx: Context): Promise<void> {
  requireFleetWide(ctx, 'procedure.write');
  const ids = new Map<string, string>();
  for (const { name, kind } of STARTER_PROCEDURES) {
    const { id } = await insertProcedure(ctx.db, { name, kind, created_at: ctx.now });
    ids.set(name, id);
  }
  for (const { name, steps, follows = {} } of STARTER_PROCEDURES)
    await insertProcedureVersion(ctx.db, {
      procedure_id: ids.get(name)!,
      steps: JSON.stringify(
        steps.map((step) => {
          const procedureId = ids.get(follows[step.key] ?? '');
          return step.onFail && procedureId ? { ...step, onFail: { ...step.onFail, procedureId } } : step;
        }),
      ),
      note: 'As shipped: to be checked against the makers’ manuals.',
      written_at: ctx.now,
      written_by: personIdOf(ctx.actor),
    });
}
