import { listProcedures as listProcedureRows } from '@/db/queries/procedures';
import type { Context } from '@/lib/context';
import type { ProcedureLine } from '@/lib/schemas/procedure';
import { requireFleetWide } from './access';
import { toProcedureLine } from './shape-procedure';

/** The procedures in use, by name. */
export async function listProcedures(ctx: Context): Promise<ProcedureLine[]> {
  requireFleetWide(ctx, 'procedure.read');
  return (await listProcedureRows(ctx.db)).map(toProcedureLine);
}
