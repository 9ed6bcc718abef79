import { formatMeasured } from '@/lib/domain/measured-value';
import { describeLimits } from '@/lib/domain/measurement';
import { describeTrend } from '@/lib/domain/measurement-series';
import type { MeasuredSeries } from '@/lib/schemas/measurements';
import { scaleOf, type Scale } from './chart-scale';

/** A mark and a dash for each place, so that none is told by colour alone. */
const MARKS = ['●', '■', '▲', '◆', '✚', '★'];
const LOOKS = [
  { ink: 'text-line', dash: undefined },
  { ink: 'text-sign', dash: '6 3' },
  { ink: 'text-due', dash: '2 3' },
  { ink: 'text-clear', dash: '8 3 2 3' },
];
const lookOf = (index: number) => ({
  mark: MARKS[index % MARKS.length]!,
  ...LOOKS[index % LOOKS.length]!,
});

/** A measured quantity over engine hours, a line for each place, with its limits, its trends and its figures. */
export function MeasurementChart({ series, noun }: { series: MeasuredSeries; noun: string }) {
  const { spec, unit, limits, places } = series;
  const scale = scaleOf(series);
  const nameOf = (place: number) => (place === 0 ? 'The unit' : `${noun} ${place}`);
  const trends = places.filter(({ trend }) => trend !== null);
  return (
    <figure className="grid content-start gap-2 border-t-2 border-edge pt-3">
      <figcaption className="grid gap-1">
        <h3 className="text-lg">{spec}</h3>
        <p>{limits ? `Limits: ${describeLimits(limits)}.` : 'No limits are given for this.'}</p>
        <p className="flex flex-wrap gap-x-4 text-ink-soft">
          {places.map(({ place }, index) => (
            <span key={place}>
              <span aria-hidden="true" className={lookOf(index).ink}>
                {lookOf(index).mark}
              </span>{' '}
              {nameOf(place)}
            </span>
          ))}
        </p>
      </figcaption>
      <Drawing series={series} scale={scale} />
      <p className="flex justify-between text-ink-soft numerals">
        <span>{Math.max(0, scale.hours.from).toFixed(0)} h</span>
        <span>{scale.hours.to.toFixed(0)} h</span>
      </p>
      {trends.map(({ place, trend }) => (
        <p key={place} className="font-semibold text-due">
          {nameOf(place)}: {describeTrend({ towards: trend!.towards, leftTenths: trend!.hoursLeft * 10 })}
        </p>
      ))}
      <details>
        <summary className="inline-flex min-h-target cursor-pointer items-center text-line underline underline-offset-4">
          Figures
        </summary>
        <table className="w-full text-left">
          <caption className="sr-only">{spec}</caption>
          <thead>
            <tr>
              <th scope="col">Engine hours</th>
              <th scope="col">Where</th>
              <th scope="col">When</th>
              <th scope="col">Measured</th>
            </tr>
          </thead>
          <tbody className="numerals">
            {places.flatMap(({ place, points }) =>
              points.map((point) => (
                <tr key={`${place}:${point.taskId}:${point.stage}`} className="border-t border-hairline">
                  <td>{point.engineHours.toFixed(1)} h</td>
                  <td>{nameOf(place)}</td>
                  <td>{point.stage === 'found' ? 'as found' : 'as left'}</td>
                  <td>{formatMeasured(point.value, unit)}</td>
                </tr>
              )),
            )}
          </tbody>
        </table>
      </details>
    </figure>
  );
}

const [WIDTH, HEIGHT] = [480, 180];
const PAD = { left: 8, right: 8, top: 8, bottom: 8 };
const across = (x: number) => PAD.left + (x * (WIDTH - PAD.left - PAD.right)) / 100;
const down = (y: number) => PAD.top + (y * (HEIGHT - PAD.top - PAD.bottom)) / 100;

function Drawing({ series: { spec, limits, places }, scale }: { series: MeasuredSeries; scale: Scale }) {
  const lines = [
    { word: 'most', value: limits?.max ?? null },
    { word: 'least', value: limits?.min ?? null },
  ].filter((line): line is { word: string; value: number } => line.value !== null);
  return (
    <svg
      viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
      role="img"
      aria-label={`${spec} over engine hours`}
      className="w-full"
    >
      <rect x="0" y="0" width={WIDTH} height={HEIGHT} className="fill-raised" />
      {lines.map(({ word, value }) => {
        const y = down(scale.at(scale.hours.from, value).y);
        return (
          <g key={word} className="text-overdue">
            <line
              x1={PAD.left}
              x2={WIDTH - PAD.right}
              y1={y}
              y2={y}
              stroke="currentColor"
              strokeWidth="1.5"
            />
          </g>
        );
      })}
      {places.map(({ place, points }, index) => {
        const { mark, ink, dash } = lookOf(index);
        const spots = points.map((point) => ({ ...scale.at(point.engineHours, point.value), point }));
        return (
          <g key={place} className={ink}>
            <polyline
              points={spots.map(({ x, y }) => `${across(x)},${down(y)}`).join(' ')}
              fill="none"
              stroke="currentColor"
              strokeWidth="1.5"
              strokeDasharray={dash}
            />
            {spots.map(({ x, y, point }) => (
              <text
                key={`${point.taskId}:${point.stage}`}
                x={across(x)}
                y={down(y) + 4}
                textAnchor="middle"
                fontSize="12"
                fill="currentColor"
              >
                {mark}
              </text>
            ))}
          </g>
        );
      })}
    </svg>
  );
}
