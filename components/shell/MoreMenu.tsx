'use client';

import Link from 'next/link';
import { useState, type ReactNode } from 'react';
import { Dialog } from '@/components/ui/Dialog';
import type { NavItem } from './nav';

/** The rest of the destinations on a phone, and what else belongs to the person, in a sheet from below. */
export function MoreMenu({ items, children }: { items: NavItem[]; children?: ReactNode }) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <button
        type="button"
        aria-haspopup="dialog"
        onClick={() => setOpen(true)}
        className="flex min-h-dock w-full flex-col items-center justify-center gap-0.5 border-t-4 border-transparent px-1 text-sm font-semibold -outline-offset-4"
      >
        <svg viewBox="0 0 24 12" className="h-3 w-6" aria-hidden="true">
          <path d="M0 2h24M0 10h24" stroke="currentColor" strokeWidth="3" />
        </svg>
        More
      </button>
      <Dialog open={open} onClose={() => setOpen(false)} title="More" sheet>
        <nav aria-label="More destinations">
          <ul className="grid">
            {items.map((item) => (
              <li key={item.href} className="border-b border-hairline">
                <Link
                  href={item.href}
                  aria-current={item.current ? 'page' : undefined}
                  onClick={() => setOpen(false)}
                  className="flex min-h-dock items-center border-l-4 border-transparent px-3 text-lg font-semibold hover:bg-shoal aria-[current=page]:border-line"
                >
                  {item.label}
                </Link>
              </li>
            ))}
          </ul>
        </nav>
        {children ? <div className="mt-4 grid gap-4">{children}</div> : null}
      </Dialog>
    </>
  );
}
