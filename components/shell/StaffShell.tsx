import Link from 'next/link';
import type { ReactNode } from 'react';
import { ToastProvider } from '@/components/ui/Toast';
import type { Theme } from '@/lib/client/theme';
import { LagLine } from './LagLine';
import { MoreMenu } from './MoreMenu';
import { splitNav, type NavItem } from './nav';
import { PersonMenu } from './PersonMenu';
import { ProductMark } from './ProductMark';

export type StaffShellProps = {
  /** Destinations in order of weight; the first three stand in a phone's bottom bar. */
  nav: NavItem[];
  homeHref: string;
  person: { name: string; role: string };
  theme: Theme;
  /** How far the worker is behind, in seconds; null while it keeps up. */
  lag: number | null;
  dockChooser?: ReactNode;
  signOut: ReactNode;
  children: ReactNode;
};

/**
 * The frame of every signed-in screen, with room for toasts. Decides nothing: what may be seen arrives as
 * `nav`.
 */
export function StaffShell({
  nav,
  homeHref,
  person,
  theme,
  lag,
  dockChooser,
  signOut,
  children,
}: StaffShellProps) {
  const { bar, more } = splitNav(nav);
  return (
    <ToastProvider>
      <a
        href="#content"
        className="sr-only z-50 bg-act px-5 py-3 font-bold text-act-ink focus:not-sr-only focus:fixed focus:top-2 focus:left-2"
      >
        Skip to content
      </a>
      <header className="no-print bg-buff">
        <div className="mx-auto flex max-w-page items-center gap-x-4 gap-y-1 px-gutter py-2">
          <Link href={homeHref} className="flex min-h-target items-center rounded">
            <ProductMark />
          </Link>
          <div className="ml-auto min-w-0">{dockChooser}</div>
          <div className="hidden md:block">
            <PersonMenu person={person} theme={theme} signOut={signOut} />
          </div>
        </div>
        <nav aria-label="Main" className="hidden md:block">
          <ul className="mx-auto flex max-w-page flex-wrap gap-x-1 px-gutter">
            {nav.map((item) => (
              <li key={item.href}>
                <Link href={item.href} aria-current={item.current ? 'page' : undefined} className="nav-item">
                  {item.label}
                </Link>
              </li>
            ))}
          </ul>
        </nav>
        <div className="water-edge" />
      </header>
      <LagLine seconds={lag} />
      <main
        id="content"
        tabIndex={-1}
        className="mx-auto max-w-page px-gutter pt-6 pb-32 outline-none md:pb-16"
      >
        {children}
      </main>
      <nav
        aria-label="Main"
        className="no-print fixed inset-x-0 bottom-0 z-30 border-t-3 border-line bg-buff pb-[env(safe-area-inset-bottom)] md:hidden"
      >
        <ul className="grid auto-cols-fr grid-flow-col">
          {bar.map((item) => (
            <li key={item.href}>
              <Link
                href={item.href}
                aria-current={item.current ? 'page' : undefined}
                className="flex min-h-dock items-center justify-center border-t-4 border-transparent px-1 text-center text-sm leading-tight font-semibold -outline-offset-4 aria-[current=page]:border-line aria-[current=page]:bg-paper aria-[current=page]:font-extrabold"
              >
                {item.label}
              </Link>
            </li>
          ))}
          <li>
            <MoreMenu items={more}>
              <PersonMenu person={person} theme={theme} signOut={signOut} open />
            </MoreMenu>
          </li>
        </ul>
      </nav>
    </ToastProvider>
  );
}
