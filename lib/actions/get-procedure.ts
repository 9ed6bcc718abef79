import { listProcedureVersions } from '@/db/queries/procedures';
import type { Context } from '@/lib/context';
import type { Procedure } from '@/lib/schemas/procedure';
import { accessProcedure } from './access';
import { toProcedure } from './shape-procedure';

/** A procedure with its latest steps, in use or retired. Throws `not_found` on `id`. */
export async function getProcedure(ctx: Context, id: string): Promise<Procedure> {
  const row = await accessProcedure(ctx, id, 'procedure.read');
  return toProcedure(row, await listProcedureVersions(ctx.db, id));
}
