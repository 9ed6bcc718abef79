import { isMeasuredUnit, type MeasuredUnit, type MeasuredValue } from './measured-value';
import { meanOf, toLimits, type Limits, type Specs } from './measurement';
import type { Stage } from './procedure';
import { computeTrend, type Trend } from './trend';
import { roundHours } from './words';

/** One measurement of a unit's life. */
export type Measured = {
  spec: string;
  place: number;
  stage: Stage;
  runs: readonly MeasuredValue[];
  engineHoursTenths: number;
  taskId: string;
};

export type SeriesPoint = { engineHoursTenths: number; value: number; stage: Stage; taskId: string };
export type PlaceSeries = { place: number; points: SeriesPoint[]; trend: Trend | null };
/** A measured quantity over a unit's engine hours, place by place; values and limits as they are kept. */
export type Series = { spec: string; unit: MeasuredUnit; limits: Limits | null; places: PlaceSeries[] };

/**
 * What was measured, by quantity and place in the order of engine hours, with the trend of what was found: what work
 * leaves behind says nothing of how it wears. A quantity that is only measured as left is read from that.
 */
export function computeSeries(measured: readonly Measured[], specs: Specs): Series[] {
  const names = [...new Set(measured.map(({ spec }) => spec))].sort();
  return names.map((spec) => {
    const ofSpec = measured.filter((one) => one.spec === spec);
    const unit = unitOf(ofSpec, specs[spec]?.unit);
    const limits = toLimits(specs[spec], unit);
    const places = [...new Set(ofSpec.map(({ place }) => place))].sort((a, b) => a - b);
    return { spec, unit, limits, places: places.map((place) => computePlace(ofSpec, place, limits)) };
  });
}

/** The unit of measure of the spec, else the one last measured in. */
function unitOf(measured: readonly Measured[], ofSpec: string | undefined): MeasuredUnit {
  return ofSpec !== undefined && isMeasuredUnit(ofSpec) ? ofSpec : (measured.at(-1)?.runs[0]?.unit ?? '');
}

function computePlace(measured: readonly Measured[], place: number, limits: Limits | null): PlaceSeries {
  const points = measured
    .filter((one) => one.place === place && one.runs.length > 0)
    .map(({ runs, engineHoursTenths, stage, taskId }) => ({
      engineHoursTenths,
      value: meanOf(runs),
      stage,
      taskId,
    }))
    .sort((a, b) => a.engineHoursTenths - b.engineHoursTenths);
  const found = points.filter(({ stage }) => stage === 'found');
  const read = found.length > 0 ? found : points;
  return { place, points, trend: limits && computeTrend(read, limits) };
}

/** 'Drifting towards the lower limit, about 40 h left.' Engine hours to whole hours: it is an estimate. */
export function describeTrend({ towards, leftTenths }: Trend): string {
  const limit = towards === 'min' ? 'lower' : 'upper';
  if (leftTenths === 0) return `Drifting past the ${limit} limit.`;
  return `Drifting towards the ${limit} limit, about ${roundHours(Math.round(leftTenths / 10) * 10)} h left.`;
}
