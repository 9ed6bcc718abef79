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
    specs: row.specs,
  };
}
