import { listModels as listModelRows } from '@/db/queries/models';
import type { Context } from '@/lib/context';
import type { Model } from '@/lib/schemas/model';
import { requireFleetWide } from './access';
import { toModel } from './shape-model';

/** Every model, by name. */
export async function listModels(ctx: Context): Promise<Model[]> {
  requireFleetWide(ctx, 'model.read');
  return (await listModelRows(ctx.db)).map(toModel);
}
