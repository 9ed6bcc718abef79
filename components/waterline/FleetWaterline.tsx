import Link from 'next/link';
import { StateMark } from '@/components/state/StateMark';
import type { UnitState } from '@/components/state/state-words';
import {
  chooseScale,
  distanceFromTop,
  governingLimit,
  placeUnit,
  sortLowestFirst,
  type Scale,
  type WaterlineUnit,
} from './geometry';
import { limitText } from './text';

export type FleetDock = { key: string; name: string; href?: string; units: WaterlineUnit[] };

const states: UnitState[] = ['ready', 'out', 'held'];

/**
 * Every dock as a strip on one scale for the whole fleet, so docks compare: a bar for each unit, standing
 * on the water line or hanging below it, lowest first, and the count of each state in words.
 */
export function FleetWaterline({ docks, label }: { docks: FleetDock[]; label: string }) {
  const scale = chooseScale(docks.flatMap((dock) => dock.units));
  return (
    <section aria-label={label} className="grid gap-6">
      <p className="text-sm text-ink-soft">
        The top of each strip is {scale.tenths / 10} h or {scale.days} days left before the next hold. Solid
        bars are ready, hollow ones out, split ones held.
      </p>
      {docks.map((dock) => (
        <div
          key={dock.key}
          className="keep-together grid gap-2 lg:grid-cols-[20rem_1fr] lg:items-end lg:gap-6"
        >
          <div>
            <h3 className="text-xl">
              {dock.href ? (
                <Link href={dock.href} className="link inline-flex min-h-target items-center">
                  {dock.name}
                </Link>
              ) : (
                dock.name
              )}
            </h3>
            <p className="flex flex-wrap gap-x-4 gap-y-1">
              {states.map((state) => (
                <StateMark
                  key={state}
                  plain
                  state={state}
                  detail={String(dock.units.filter((unit) => unit.state === state).length)}
                />
              ))}
            </p>
            <Lowest units={dock.units} />
          </div>
          <Strip units={dock.units} scale={scale} />
        </div>
      ))}
    </section>
  );
}

/** Names the unit that lies lowest, which is the next to cost a day's hire. */
function Lowest({ units }: { units: WaterlineUnit[] }) {
  const [lowest] = sortLowestFirst(units.filter((unit) => governingLimit(unit) !== null));
  if (!lowest) return null;
  return (
    <p className="mt-1 text-ink-soft">
      Lowest: <span className="numerals font-bold text-ink">{lowest.fleetNumber}</span>, {limitText(lowest)}
    </p>
  );
}

function Strip({ units, scale }: { units: WaterlineUnit[]; scale: Scale }) {
  const placed = sortLowestFirst(units).map((unit) => ({ unit, height: placeUnit(unit, scale).height }));
  const slots = Math.max(24, placed.length);
  const water = distanceFromTop(0, 90);
  return (
    <svg
      viewBox={`0 0 ${slots * 10} 90`}
      preserveAspectRatio="none"
      className="h-24 w-full"
      aria-hidden="true"
    >
      <rect y={water} width="100%" height={90 - water} className="fill-shoal" />
      {placed.map(({ unit, height }, index) => {
        const y = distanceFromTop(height, 90);
        const tall = Math.max(3, Math.abs(y - water));
        const bar = { y: height >= 0 ? water - tall : water, height: tall };
        const x = index * 10 + 2;
        if (unit.state === 'held') {
          return (
            <g key={unit.fleetNumber} className="fill-held">
              <rect {...bar} x={x} width="2" />
              <rect {...bar} x={x + 4} width="2" />
            </g>
          );
        }
        return unit.state === 'out' ? (
          <rect
            {...bar}
            key={unit.fleetNumber}
            x={x}
            width="6"
            vectorEffect="non-scaling-stroke"
            className="fill-paper stroke-out stroke-2"
          />
        ) : (
          <rect {...bar} key={unit.fleetNumber} x={x} width="6" className="fill-ready" />
        );
      })}
      <rect y={water - 1} width="100%" height="2" className="fill-line" />
    </svg>
  );
}
