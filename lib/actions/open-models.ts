import { listUnits } from '@/db/queries/units';
import type { Context } from '@/lib/context';
import { canFleetWide, visibleDocks } from '@/lib/domain/access';
import type { ModelsPage } from '@/lib/schemas/fleet';
import { listModels } from './list-models';

/** What the screen of models is drawn from: every model, with how many units of it the actor's docks have. */
export async function openModels(ctx: Context): Promise<ModelsPage> {
  const [models, units] = await Promise.all([listModels(ctx), listUnits(ctx.db, visibleDocks(ctx.actor))]);
  return {
    models: models.map((model) => ({
      ...model,
      unitCount: units.filter((unit) => unit.model_id === model.id).length,
    })),
    mayWrite: canFleetWide(ctx.actor, 'model.write'),
  };
}
