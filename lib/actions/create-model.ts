import { insertModel } from '@/db/queries/models';
import type { Context } from '@/lib/context';
import type { CreateModel, Model } from '@/lib/schemas/model';
import { requireFleetWide } from './access';
import { refusingTaken } from './refusing-taken';
import { MODEL_NAME, toModel } from './shape-model';

/** Adds a model. Managers of all docks only. Throws `conflict` on `name` when a model has that name already. */
export async function createModel(ctx: Context, input: CreateModel): Promise<Model> {
  requireFleetWide(ctx, 'model.write');
  const row = await refusingTaken(MODEL_NAME, () =>
    insertModel(ctx.db, {
      name: input.name,
      propulsion: input.propulsion,
      stroke: input.stroke ?? null,
      engines: input.engines,
      cylinders: input.cylinders,
      carb_count: input.carbCount,
      specs: JSON.stringify(input.specs ?? {}),
    }),
  );
  return toModel(row);
}
