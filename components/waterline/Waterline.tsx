import { cx } from '@/components/ui/cx';
import { chooseScale, distanceFromTop, placeUnit, ticksOf, type WaterlineUnit } from './geometry';
import { Hull, hullHeight, hullWidth } from './Hull';
import { fullAmount, unitText } from './text';

const magnify = 2.6;
const top = (height: number) => `${distanceFromTop(height, 100)}%`;

/**
 * One unit at its own scale: it floats above the line by what is left before its next hold, hours or days,
 * whichever is sooner, or hangs below by how far it is past. Hours are numbered on the left, days on the
 * right. Without `hoursPerDayTenths` five hours count as three days. `tall` is for the unit's own screen.
 */
export function Waterline({ unit, tall = false }: { unit: WaterlineUnit; tall?: boolean }) {
  const scale = chooseScale([unit]);
  const { height, beyond, limit } = placeUnit(unit, scale);
  const afloat = height >= 0;
  const halfWidth = (hullWidth * magnify) / 2;
  return (
    <figure className="keep-together">
      <figcaption className="sr-only">{unitText(unit)}</figcaption>
      <div aria-hidden="true" className={cx('px-1 pt-24', afloat ? 'pb-2' : 'pb-24')}>
        <svg className={cx('block w-full overflow-visible', tall ? 'h-72' : 'h-52')}>
          <rect y={top(0)} width="100%" height={`${100 - distanceFromTop(0, 100)}%`} className="fill-shoal" />
          {afloat ? null : <rect y="100%" width="100%" height="5.5rem" className="fill-shoal" />}
          {ticksOf(scale).map((tick) => (
            <g key={tick.height} className="fill-ink-soft">
              <line
                x1="0"
                x2="100%"
                y1={top(tick.height)}
                y2={top(tick.height)}
                className="stroke-hairline"
              />
              <line
                x1="0"
                x2="14"
                y1={top(tick.height)}
                y2={top(tick.height)}
                className="stroke-line"
                strokeWidth="2"
              />
              {limit ? (
                <>
                  <Tick x="0" y={top(tick.height)} anchor="start" text={`${signed(tick.hours)} h`} />
                  <Tick x="100%" y={top(tick.height)} anchor="end" text={`${signed(tick.days)} d`} />
                </>
              ) : null}
            </g>
          ))}
          <line x1="0" x2="100%" y1={top(0)} y2={top(0)} className="stroke-line" strokeWidth="4" />
          <line
            x1="50%"
            x2="50%"
            y1={top(0)}
            y2={top(height)}
            className="stroke-ink"
            strokeWidth="1.5"
            strokeDasharray="2 4"
          />
          <svg x="50%" y={top(height)} className="overflow-visible">
            <g transform={`translate(${-halfWidth} ${afloat ? -hullHeight * magnify : 0}) scale(${magnify})`}>
              <Hull state={unit.state} beyond={beyond && afloat} />
            </g>
            <text
              y={afloat ? -hullHeight * magnify - 14 : hullHeight * magnify + 30}
              textAnchor="middle"
              paintOrder="stroke"
              strokeWidth="8"
              className={cx(
                'font-bold',
                limit ? 'numerals text-3xl' : 'text-2xl',
                afloat ? 'fill-ink stroke-paper' : 'fill-held stroke-shoal',
              )}
            >
              {limit ? fullAmount(unit) : 'no hold ahead'}
            </text>
          </svg>
        </svg>
      </div>
    </figure>
  );
}

function signed(value: number): string {
  return value < 0 ? `−${-value}` : String(value);
}

function Tick({ x, y, anchor, text }: { x: string; y: string; anchor: 'start' | 'end'; text: string }) {
  return (
    <svg x={x} y={y} className="overflow-visible">
      <text x={anchor === 'start' ? 18 : -2} y="-4" textAnchor={anchor} className="numerals text-sm">
        {text}
      </text>
    </svg>
  );
}
