import { cx } from '@/components/ui/cx';
import { StateShape } from './StateShape';
import { stateWords, type DueState, type UnitState } from './state-words';

const colours: Record<UnitState | DueState, { text: string; tint: string }> = {
  ready: { text: 'text-ready', tint: 'bg-ready-tint' },
  out: { text: 'text-out', tint: 'bg-out-tint' },
  held: { text: 'text-held', tint: 'bg-held-tint' },
  clear: { text: 'text-clear', tint: 'bg-clear-tint' },
  upcoming: { text: 'text-upcoming', tint: 'bg-upcoming-tint' },
  due: { text: 'text-due', tint: 'bg-due-tint' },
  overdue: { text: 'text-overdue', tint: 'bg-overdue-tint' },
};

/**
 * A state as mark, word and colour together. `detail` goes on after the word ("Overdue by 3 days");
 * `plain` leaves the ground out, for use inside running rows.
 */
export function StateMark({
  state,
  detail,
  size = 'normal',
  plain = false,
}: {
  state: UnitState | DueState;
  detail?: string;
  size?: 'normal' | 'large';
  plain?: boolean;
}) {
  const large = size === 'large';
  return (
    <span
      className={cx(
        'inline-flex items-center font-bold',
        large ? 'gap-3 text-2xl' : 'gap-2',
        colours[state].text,
        !plain &&
          cx(
            'rounded-hull border-l-4 border-current',
            colours[state].tint,
            large ? 'py-2 pr-5 pl-3' : 'py-0.5 pr-3 pl-2',
          ),
      )}
    >
      <svg viewBox="0 0 20 20" className={cx('shrink-0', large ? 'size-7' : 'size-4')} aria-hidden="true">
        <StateShape state={state} />
      </svg>
      <span>
        {stateWords[state]}
        {detail ? ` ${detail}` : null}
      </span>
    </span>
  );
}
