import type { ReactNode } from 'react';
import { cx } from './cx';

export type Tone = 'info' | 'ok' | 'warn' | 'danger';

const tones: Record<Tone, { box: string; word: string; mark: ReactNode }> = {
  info: {
    box: 'border-info bg-info-tint',
    word: 'text-info',
    mark: (
      <>
        <circle cx="10" cy="10" r="8.5" fill="none" stroke="currentColor" strokeWidth="2" />
        <path d="M9 8.5h2V15H9zM9 5h2v2H9z" fill="currentColor" />
      </>
    ),
  },
  ok: {
    box: 'border-ok bg-ok-tint',
    word: 'text-ok',
    mark: <path d="m2 10.5 5.5 6L18 4" fill="none" stroke="currentColor" strokeWidth="3" />,
  },
  warn: {
    box: 'border-warn bg-warn-tint',
    word: 'text-warn',
    mark: (
      <>
        <path d="M10 1 19.5 18H.5Z" fill="currentColor" />
        <path d="M9 7h2v6H9zm0 7.2h2v2H9z" className="fill-warn-tint" />
      </>
    ),
  },
  danger: {
    box: 'border-danger bg-danger-tint',
    word: 'text-danger',
    mark: (
      <>
        <path d="M6 1h8l5 5v8l-5 5H6l-5-5V6Z" fill="currentColor" />
        <path d="M9 4.5h2v7H9zm0 9h2v2H9z" className="fill-danger-tint" />
      </>
    ),
  },
};

/**
 * A message that stays. `warn` and `danger` are announced at once when they appear (`role="alert"`),
 * the others politely; `still` is for what was on the page from the start.
 */
export function Notice({
  tone = 'info',
  title,
  children,
  action,
  still = false,
}: {
  tone?: Tone;
  title?: ReactNode;
  children?: ReactNode;
  action?: ReactNode;
  still?: boolean;
}) {
  const { box, word, mark } = tones[tone];
  const role = tone === 'warn' || tone === 'danger' ? 'alert' : 'status';
  return (
    <div
      role={still ? undefined : role}
      className={cx('flex gap-3 rounded border-l-8 px-4 py-3 text-ink', box)}
    >
      <svg viewBox="0 0 20 20" className={cx('mt-0.5 size-5 shrink-0', word)} aria-hidden="true">
        {mark}
      </svg>
      <div className="grid min-w-0 grow content-start gap-1">
        {title ? <p className={cx('font-bold', word)}>{title}</p> : null}
        {children ? <div className="max-w-prose">{children}</div> : null}
        {action ? <div className="mt-1">{action}</div> : null}
      </div>
    </div>
  );
}
