import type { ReactNode } from 'react';

/** What stands where there is nothing yet: what would be here, and what to do about it. */
export function EmptyState({
  title,
  children,
  action,
}: {
  title: ReactNode;
  children?: ReactNode;
  action?: ReactNode;
}) {
  return (
    <div className="grid justify-items-start gap-2 py-6">
      <svg viewBox="0 0 240 28" className="h-7 w-60 text-line" aria-hidden="true">
        <path d="M0 14h240" stroke="currentColor" strokeWidth="3" />
        <path
          d="M20 14v5M40 14v5M60 14v5M80 14v5M100 14v9M120 14v5M140 14v5M160 14v5M180 14v5M200 14v9M220 14v5"
          stroke="currentColor"
        />
        <circle cx="100" cy="8" r="4" fill="none" stroke="currentColor" strokeWidth="2" />
      </svg>
      <p className="text-lg font-bold">{title}</p>
      {children ? <div className="max-w-prose text-ink-soft">{children}</div> : null}
      {action ? <div className="mt-2">{action}</div> : null}
    </div>
  );
}
