import type { ReactNode } from 'react';
import type { Theme } from '@/lib/client/theme';
import { ThemeChoice } from './ThemeChoice';

/** Who is signed in, how they read, and the way out. `open` lays it out flat instead of folding it away. */
export function PersonMenu({
  person,
  theme,
  signOut,
  open = false,
}: {
  person: { name: string; role: string };
  theme: Theme;
  signOut: ReactNode;
  open?: boolean;
}) {
  const content = (
    <div className="grid gap-4">
      <ThemeChoice theme={theme} />
      {signOut}
    </div>
  );
  const who = (
    <>
      <span className="font-semibold">{person.name}</span>{' '}
      <span className="text-ink-soft">· {person.role}</span>
    </>
  );
  if (open) {
    return (
      <>
        <p>{who}</p>
        {content}
      </>
    );
  }
  return (
    <details className="relative">
      <summary className="flex min-h-target list-none items-center gap-1 rounded px-2 hover:bg-shoal [&::-webkit-details-marker]:hidden">
        {who}
        <svg viewBox="0 0 12 8" className="ml-1 h-2 w-3" aria-hidden="true">
          <path d="m1 1 5 5 5-5" fill="none" stroke="currentColor" strokeWidth="2" />
        </svg>
      </summary>
      <div className="absolute right-0 z-40 mt-1 w-max min-w-64 border-2 border-t-4 border-edge border-t-line bg-raised p-4">
        {content}
      </div>
    </details>
  );
}
