import { findModel } from '@/db/queries/models';
import { listMeasured } from '@/db/queries/step-entries';
import type { Context } from '@/lib/context';
import { mergeSpecs } from '@/lib/domain/measurement';
import { computeSeries } from '@/lib/domain/measurement-series';
import { toHours } from '@/lib/schemas/schedule-shape';
import type { Measurements } from '@/lib/schemas/measurements';
import { accessUnit } from './access';

/** What was measured on a unit over its engine hours, by quantity and place. Throws `not_found`, `forbidden`. */
export async function listMeasurements(ctx: Context, unitId: string): Promise<Measurements> {
  const unit = await accessUnit(ctx, unitId, 'unit.read');
  const [model, rows] = await Promise.all([findModel(ctx.db, unit.model_id), listMeasured(ctx.db, unit.id)]);
  const measured = rows.flatMap((row) =>
    row.value.kind === 'measurement'
      ? [
          {
            spec: row.spec,
            place: row.place,
            stage: row.stage,
            runs: row.value.runs,
            engineHoursTenths: row.engine_hours_tenths,
            taskId: row.task_id,
          },
        ]
      : [],
  );
  const series = computeSeries(measured, mergeSpecs(model?.specs ?? {}, unit.specs));
  return {
    items: series.map(({ places, ...rest }) => ({
      ...rest,
      places: places.map(({ place, points, trend }) => ({
        place,
        points: points.map(({ engineHoursTenths, ...point }) => ({
          ...point,
          engineHours: toHours(engineHoursTenths),
        })),
        trend: trend && { towards: trend.towards, hoursLeft: toHours(trend.leftTenths) },
      })),
    })),
    nextCursor: null,
  };
}
