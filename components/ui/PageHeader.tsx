import type { ReactNode } from 'react';

/**
 * The head of a screen. The title stands above the water line; what belongs to the whole screen (facts,
 * filters) hangs below it in `children`.
 */
export function PageHeader({
  title,
  kicker,
  lead,
  actions,
  children,
}: {
  title: ReactNode;
  kicker?: ReactNode;
  lead?: ReactNode;
  actions?: ReactNode;
  children?: ReactNode;
}) {
  return (
    <header className="mb-6">
      <div className="water-edge flex flex-wrap items-end justify-between gap-x-6 gap-y-3 pb-3">
        <div className="min-w-0">
          {kicker ? <p className="mb-1 font-semibold text-ink-soft">{kicker}</p> : null}
          <h1 className="text-3xl sm:text-4xl">{title}</h1>
        </div>
        {actions ? <div className="no-print flex flex-wrap gap-2">{actions}</div> : null}
      </div>
      <div className="plumb-ticks" aria-hidden="true" />
      {lead ? <p className="mt-3 max-w-prose text-lg">{lead}</p> : null}
      {children ? <div className="mt-3">{children}</div> : null}
    </header>
  );
}
