import type { ModelRow } from '@/db/queries/models';
import type { Model } from '@/lib/schemas/model';

/** A model as the API and the screens show it. */
export function toModel(row: ModelRow): Model {
  return {
    id: row.id,
    name: row.name,
    propulsion: row.propulsion,
    stroke: row.stroke,
    engines: row.engines,
    cylinders: row.cylinders,
    carbCount: row.carb_count,
    specs: row.specs as Model['specs'],
  };
}

/** What the unique index of `model` says. */
export const MODEL_NAME: Record<string, [path: string, message: string]> = {
  model_name: ['name', 'A model has that name already.'],
};
