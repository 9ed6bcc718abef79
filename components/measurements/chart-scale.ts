import { fromKept } from '@/lib/domain/measured-value';
import type { MeasuredSeries } from '@/lib/schemas/measurements';

/** A point of the drawing, in its own units: 0 to 100 across, 0 to 100 down. */
export type Spot = { x: number; y: number };
export type Scale = {
  at: (engineHours: number, value: number) => Spot;
  hours: { from: number; to: number };
  values: { from: number; to: number };
};

/** A scale that shows every point and both limits, with a little air. Values are turned into the series' unit. */
export function scaleOf({ places, limits, unit }: MeasuredSeries): Scale {
  const points = places.flatMap((place) => place.points);
  const shown = [
    ...points.map(({ value }) => value),
    ...(limits ? [limits.min, limits.max, limits.target].filter((value) => value !== null) : []),
  ].map((value) => fromKept(value, unit));
  const hours = spanOf(
    points.map(({ engineHours }) => engineHours),
    0.02,
  );
  const values = spanOf(shown, 0.1);
  return {
    hours,
    values,
    at: (engineHours, value) => ({
      x: (100 * (engineHours - hours.from)) / (hours.to - hours.from),
      y: 100 - (100 * (fromKept(value, unit) - values.from)) / (values.to - values.from),
    }),
  };
}

function spanOf(numbers: readonly number[], air: number): { from: number; to: number } {
  const [low, high] = [Math.min(...numbers), Math.max(...numbers)];
  const room = (high - low || Math.abs(high) || 1) * air;
  return { from: low - room, to: high + room };
}
