import { lockModel, updateModel, type ModelRow } from '@/db/queries/models';
import { listScopedUnits, lockScopesForChange } from '@/db/queries/scopes';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { Refusal, refuseField } from '@/lib/errors';
import { findEngineFaults, type ChangeModel, type Model } from '@/lib/schemas/model';
import { requireFleetWide } from './access';
import { assessAgain } from './assess-again';
import { refusingTaken } from './refusing-taken';
import { MODEL_NAME, toModel } from './shape-model';

/**
 * Changes what is named of a model. What decides which rules are for its units (propulsion, stroke, carburettors)
 * has them assessed again; until then they are held. Managers of all docks only.
 * Throws `not_found` on `id`, `conflict` on `name` when a model has that name already, `invalid_input` on `stroke`
 * or `carbCount` when the model would contradict itself.
 */
export async function changeModel(ctx: Context, id: string, input: ChangeModel): Promise<Model> {
  requireFleetWide(ctx, 'model.write');
  return refusingTaken(MODEL_NAME, () =>
    runTransaction(ctx.db, async (trx) => {
      await lockScopesForChange(trx);
      const before = await lockModel(trx, id);
      if (!before) throw refuseField('id', 'is no model of this fleet', 'not_found');
      const change = toChange(input);
      checkEngine({ ...before, ...change });
      const after = await updateModel(trx, id, {
        ...change,
        ...(input.specs && { specs: JSON.stringify(input.specs) }),
      });
      if (changesScope(before, after)) {
        const units = await listScopedUnits(trx);
        await assessAgain(
          trx,
          units.filter((unit) => unit.modelId === id).map((unit) => unit.id),
        );
      }
      return toModel(after);
    }),
  );
}

function toChange(input: ChangeModel) {
  return {
    ...(input.name !== undefined && { name: input.name }),
    ...(input.propulsion !== undefined && { propulsion: input.propulsion }),
    ...(input.stroke !== undefined && { stroke: input.stroke }),
    ...(input.engines !== undefined && { engines: input.engines }),
    ...(input.cylinders !== undefined && { cylinders: input.cylinders }),
    ...(input.carbCount !== undefined && { carb_count: input.carbCount }),
  };
}

function checkEngine({ propulsion, stroke, carb_count: carbCount }: ModelRow): void {
  const faults = findEngineFaults({ propulsion, stroke, carbCount });
  if (faults.length > 0)
    throw new Refusal('invalid_input', faults.map((fault) => fault.message).join('; '), faults);
}

function changesScope(before: ModelRow, after: ModelRow): boolean {
  return (
    before.propulsion !== after.propulsion ||
    before.stroke !== after.stroke ||
    before.carb_count !== after.carb_count
  );
}
