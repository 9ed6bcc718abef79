import type { Context } from '@/lib/context';
import type { Model } from '@/lib/schemas/model';
import { accessModel } from './access';
import { toModel } from './shape-model';

/** One model. Throws `not_found`. */
export async function getModel(ctx: Context, id: string): Promise<Model> {
  return toModel(await accessModel(ctx, id, 'model.read'));
}
