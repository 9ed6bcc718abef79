import Link from 'next/link';
import type { ReactNode } from 'react';

/** One unit of the board: the whole row is the target, at least 56 px high. */
export function BoardRow({
  href,
  fleetNumber,
  modelName,
  facts,
  act,
}: {
  href: string;
  fleetNumber: string;
  modelName: string;
  facts: ReactNode;
  /** What a tap does: "Check out". */
  act: string;
}) {
  return (
    <Link
      href={href}
      className="group flex min-h-dock items-center gap-4 border-b-2 border-hairline py-3 text-ink no-underline -outline-offset-2 hover:bg-shoal"
    >
      <span className="grid min-w-0 grow gap-0.5">
        <span className="flex flex-wrap items-baseline gap-x-3">
          <span className="numerals text-2xl font-bold">{fleetNumber}</span>
          <span className="text-ink-soft">{modelName}</span>
        </span>
        <span className="min-w-0">{facts}</span>
      </span>
      <span className="flex min-h-dock shrink-0 items-center rounded-hull border-2 border-act bg-act px-4 font-semibold text-act-ink group-hover:border-act-over group-hover:bg-act-over">
        {act}
      </span>
    </Link>
  );
}
