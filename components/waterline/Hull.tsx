import { cx } from '@/components/ui/cx';
import type { UnitState } from '@/components/state/state-words';

/** The hull's box; its keel is the bottom edge. */
export const hullWidth = 44;
export const hullHeight = 22;

const fills: Record<UnitState, string> = { ready: 'text-ready', out: 'text-out', held: 'text-held' };

/**
 * A small craft seen from the side, keel at the bottom, bow to the right. Told apart without colour: a
 * ready one is solid, one that is out flies a pennant and is drawn in outline, a held one is barred.
 */
export function Hull({ state, beyond = false }: { state: UnitState; beyond?: boolean }) {
  const solid = state !== 'out';
  return (
    <g className={cx(fills[state])}>
      <path
        d="M1 12.5 3 11h9l2.5-4H22l3 2.6 1-6.1 5.5-1.3.6 2-4.1 1.2 1.4 4.4C34.500 10 40 10.500 43.500 11.500 41.500 17 37 21.500 30 21.500H7.500C4.500 21.500 2 19 1 12.500Z"
        fill={solid ? 'currentColor' : 'none'}
        stroke="currentColor"
        strokeWidth={solid ? 1 : 2}
        strokeLinejoin="round"
        className={solid ? undefined : 'fill-paper'}
      />
      {state === 'held' ? <path d="M7 16.500h29" className="stroke-paper" strokeWidth="3" /> : null}
      {state === 'out' ? (
        <path d="M6 11V0l9 3-9 3" fill="none" stroke="currentColor" strokeWidth="2" />
      ) : null}
      {beyond ? <path d="m18-3 4-4 4 4" fill="none" stroke="currentColor" strokeWidth="2" /> : null}
    </g>
  );
}
