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
        d="M1 14C5 13 7 9.5 12 9c3-.2 5 1 8 2s4 0 5.5-2 3.5-2 5.5-.8C35 10.5 39 12 43.5 12.5 41 17.5 36 21.5 29 21.5H7C4 21.5 1.5 18.5 1 14Z"
        fill={solid ? 'currentColor' : 'none'}
        stroke="currentColor"
        strokeWidth={solid ? 1 : 2}
        strokeLinejoin="round"
        className={solid ? undefined : 'fill-paper'}
      />
      <path
        d="m25.5 8.5-3-5m-3 .5 5-2"
        fill="none"
        stroke="currentColor"
        strokeWidth="2.2"
        strokeLinecap="round"
      />
      {state === 'held' ? null : (
        <path
          d="M2 15.5c14 1 28 .2 40-2"
          fill="none"
          strokeWidth="1.4"
          className={solid ? 'stroke-paper' : 'stroke-current'}
        />
      )}
      {state === 'held' ? <path d="M7 16.5h29" className="stroke-paper" strokeWidth="3" /> : null}
      {state === 'out' ? (
        <path d="M5 10v-12l9 3.2-9 3.2" fill="none" stroke="currentColor" strokeWidth="2" />
      ) : null}
      {beyond ? <path d="m29-3 4-4 4 4" fill="none" stroke="currentColor" strokeWidth="2" /> : null}
    </g>
  );
}
