import type { ReactNode } from 'react';
import { cx } from './cx';
import type { Tone } from './Notice';

const tones: Record<Tone | 'plain', string> = {
  plain: 'border-edge text-ink',
  info: 'border-info bg-info-tint text-info',
  ok: 'border-ok bg-ok-tint text-ok',
  warn: 'border-warn bg-warn-tint text-warn',
  danger: 'border-danger bg-danger-tint text-danger',
};

/** A short word beside something. Its text carries the meaning; the colour only helps. */
export function Tag({ tone = 'plain', children }: { tone?: Tone | 'plain'; children: ReactNode }) {
  return (
    <span
      className={cx('inline-flex items-center rounded border px-2 py-0.5 text-sm font-semibold', tones[tone])}
    >
      {children}
    </span>
  );
}
