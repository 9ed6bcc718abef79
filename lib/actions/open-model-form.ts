import type { Context } from '@/lib/context';
import { canFleetWide } from '@/lib/domain/access';
import type { Model } from '@/lib/schemas/model';
import { requireFleetWide } from './access';
import { getModel } from './get-model';

/**
 * What the form of a model is drawn from, for a new one when `modelId` is null; `mayWrite` says whether the actor may
 * save it. Throws `not_found`, or `forbidden`.
 */
export async function openModelForm(
  ctx: Context,
  modelId: string | null,
): Promise<{ model: Model | null; mayWrite: boolean }> {
  if (!modelId) requireFleetWide(ctx, 'model.write');
  return {
    model: modelId ? await getModel(ctx, modelId) : null,
    mayWrite: canFleetWide(ctx.actor, 'model.write'),
  };
}
