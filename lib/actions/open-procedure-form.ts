import { listModels } from '@/db/queries/models';
import type { Context } from '@/lib/context';
import type { ProcedureFormData } from '@/lib/schemas/procedure';
import { requireFleetWide } from './access';
import { getProcedure } from './get-procedure';

/**
 * What the form of a procedure is drawn from, for a new one when `id` is null: its latest version, and the names of
 * the specs that models have. Managers and mechanics of all docks. Throws `not_found` on `id`.
 */
export async function openProcedureForm(ctx: Context, id: string | null): Promise<ProcedureFormData> {
  requireFleetWide(ctx, 'procedure.write');
  const [procedure, models] = await Promise.all([id ? getProcedure(ctx, id) : null, listModels(ctx.db)]);
  const names = new Set(models.flatMap(({ specs }) => Object.keys(specs)));
  return { procedure, specNames: [...names].sort() };
}
