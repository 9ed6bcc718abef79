import Link from 'next/link';

export type SectionLink = { href: string; label: string; current: boolean; count?: number };

/** The parts of one screen as links in a row; the current one stands on the line. */
export function SectionNav({ label, sections }: { label: string; sections: SectionLink[] }) {
  return (
    <nav aria-label={label} className="no-print overflow-x-auto border-b-2 border-hairline">
      <ul className="flex gap-1">
        {sections.map((section) => (
          <li key={section.href}>
            <Link
              href={section.href}
              aria-current={section.current ? 'page' : undefined}
              className="-mb-0.5 flex min-h-target items-center gap-2 border-b-4 border-transparent px-3 whitespace-nowrap -outline-offset-4 hover:border-edge aria-[current=page]:border-line aria-[current=page]:font-bold"
            >
              {section.label}
              {section.count === undefined ? null : (
                <span className="numerals rounded bg-shoal px-1.5 text-sm">{section.count}</span>
              )}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
