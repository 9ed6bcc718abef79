import Link from 'next/link';
import { cx } from '@/components/ui/cx';
import {
  chooseScale,
  distanceFromTop,
  governingLimit,
  placeUnit,
  ticksOf,
  type Scale,
  type WaterlineUnit,
} from './geometry';
import { Hull, hullHeight, hullWidth } from './Hull';
import { limitText, shortAmount } from './text';
import { stateWords } from '@/components/state/state-words';

const top = (height: number) => `${distanceFromTop(height, 100)}%`;

/**
 * The units of a dock along one water line, in the order given, each at its own height on one scale. The
 * line goes on in further rows where the screen is narrow. Each unit with an `href` is a link at least
 * 44 px wide and says in words what its place means.
 */
export function DockWaterline({ units, label }: { units: WaterlineUnit[]; label: string }) {
  const scale = chooseScale(units);
  const byOutings = units.some((unit) => governingLimit(unit)?.by === 'outings');
  const longest = Math.max(0, ...units.map((unit) => unit.fleetNumber.length));
  return (
    <figure>
      <figcaption className="mb-1 flex flex-wrap justify-between gap-x-6 text-sm text-ink-soft">
        <span className="font-semibold text-ink">{label}</span>
        <span>
          One step is <Step scale={scale} />. Above the line: left before the next hold. Below: past it. A
          pennant is out, a crossbar is held{byOutings ? ', × counts outings' : ''}.
        </span>
      </figcaption>
      <ul
        className={cx(
          'waterline-rows',
          scale.steps === 2 ? 'waterline-coarse' : 'waterline-fine',
          longest > 7 && 'waterline-wide',
        )}
      >
        {units.map((unit) => (
          <li key={unit.fleetNumber} className="min-w-0">
            <Berth unit={unit} scale={scale} />
          </li>
        ))}
      </ul>
    </figure>
  );
}

function Step({ scale }: { scale: Scale }) {
  const [topTick, next] = ticksOf(scale);
  const hours = (topTick?.hours ?? 0) - (next?.hours ?? 0);
  const days = (topTick?.days ?? 0) - (next?.days ?? 0);
  return (
    <strong className="text-ink">
      {hours} h or {days} days
    </strong>
  );
}

function Berth({ unit, scale }: { unit: WaterlineUnit; scale: Scale }) {
  const { height, beyond } = placeUnit(unit, scale);
  const afloat = height >= 0;
  const content = (
    <>
      <span className="sr-only">
        {unit.fleetNumber}, {stateWords[unit.state].toLowerCase()}: {limitText(unit)}
      </span>
      <span aria-hidden="true" className="block">
        <svg className="waterline-plot block w-full overflow-visible">
          <line
            x1="50%"
            x2="50%"
            y1={top(0)}
            y2={top(height)}
            className="stroke-edge"
            strokeDasharray="1 3"
          />
          <svg x="50%" y={top(height)} className="overflow-visible">
            <g transform={`translate(${-hullWidth / 2} ${afloat ? -hullHeight - 1 : 1})`}>
              <Hull state={unit.state} beyond={beyond && afloat} />
            </g>
          </svg>
        </svg>
        <span className="numerals block truncate text-sm font-bold">{unit.fleetNumber}</span>
        <span
          className={cx(
            'numerals block text-sm tracking-tighter whitespace-nowrap',
            afloat ? 'text-ink-soft' : 'font-bold text-held',
          )}
        >
          {shortAmount(unit)}
        </span>
      </span>
    </>
  );
  const box = 'waterline-berth block text-center text-ink no-underline';
  return unit.href ? (
    <Link href={unit.href} className={cx(box, 'rounded hover:bg-shoal hover:underline')}>
      {content}
    </Link>
  ) : (
    <div className={box}>{content}</div>
  );
}
