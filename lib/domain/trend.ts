import type { Limits } from './measurement';

/** One measurement over a unit's life: at what engine hours (tenths), and its value as it is kept. */
export type TrendPoint = { engineHoursTenths: number; value: number };
/** Where a measured quantity is heading, and how many engine hours (tenths) until it is there: 0 when it is. */
export type Trend = { towards: 'min' | 'max'; leftTenths: number };

/** The fewest points a trend is read from: of four, one outlier can still feign a slope. */
const FEWEST = 5;
/** A limit further away than this many times the hours seen is no news. */
const FURTHEST = 3;
/**
 * Student's t, two-sided 5 %, by degrees of freedom from 3 (NIST/SEMATECH e-Handbook of Statistical Methods,
 * 1.3.6.7.2, the column of 0.975); beyond the table the last is used, which is a little strict.
 */
const T_975 = [
  3.182, 2.776, 2.571, 2.447, 2.365, 2.306, 2.262, 2.228, 2.201, 2.179, 2.16, 2.145, 2.131, 2.12, 2.11, 2.101,
  2.093, 2.086,
];

/**
 * Whether the quantity drifts towards a limit, by a least-squares line over engine hours whose slope differs from
 * none at the 5 % level. Null, for silence, when there are too few points, no such drift, or none of a limit.
 */
export function computeTrend(
  points: readonly TrendPoint[],
  limits: Pick<Limits, 'min' | 'max'>,
): Trend | null {
  if (points.length < FEWEST) return null;
  const line = fitLine(points);
  if (!line || !isDrift(line, points.length)) return null;
  const towards = line.slope < 0 ? 'min' : 'max';
  const limit = limits[towards];
  if (limit === null) return null;
  const hours = points.map(({ engineHoursTenths }) => engineHoursTenths);
  const [first, last] = [Math.min(...hours), Math.max(...hours)];
  const leftTenths = Math.max(0, (limit - (line.intercept + line.slope * last)) / line.slope);
  return leftTenths > FURTHEST * (last - first) ? null : { towards, leftTenths: Math.round(leftTenths) };
}

type Line = { slope: number; intercept: number; slopeError: number };

/** The least-squares line; null when all points are at one hour. */
function fitLine(points: readonly TrendPoint[]): Line | null {
  const n = points.length;
  const meanX = points.reduce((sum, { engineHoursTenths }) => sum + engineHoursTenths, 0) / n;
  const meanY = points.reduce((sum, { value }) => sum + value, 0) / n;
  const sxx = points.reduce((sum, { engineHoursTenths: x }) => sum + (x - meanX) ** 2, 0);
  if (sxx === 0) return null;
  const sxy = points.reduce((sum, { engineHoursTenths: x, value: y }) => sum + (x - meanX) * (y - meanY), 0);
  const slope = sxy / sxx;
  const intercept = meanY - slope * meanX;
  const rest = points.reduce(
    (sum, { engineHoursTenths: x, value: y }) => sum + (y - intercept - slope * x) ** 2,
    0,
  );
  return { slope, intercept, slopeError: Math.sqrt(rest / (n - 2) / sxx) };
}

function isDrift({ slope, slopeError }: Line, count: number): boolean {
  const t = T_975[Math.min(count - 2 - 3, T_975.length - 1)]!;
  return Math.abs(slope) > t * slopeError && slope !== 0;
}
