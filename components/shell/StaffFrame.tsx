'use client';

import { usePathname } from 'next/navigation';
import type { ReactNode } from 'react';
import { SignOutButton } from '@/components/account/SignOutButton';
import { ToastProvider } from '@/components/ui/Toast';
import type { Theme } from '@/lib/client/theme';
import { isAt, type Destination } from './destinations';
import { StaffShell } from './StaffShell';

/** The shell with the present destination marked: a layout is not drawn again when one goes from page to page. */
export function StaffFrame({
  destinations,
  person,
  theme,
  lag,
  children,
}: {
  destinations: Destination[];
  person: { name: string; role: string };
  theme: Theme;
  lag: number | null;
  children: ReactNode;
}) {
  const path = usePathname();
  return (
    <ToastProvider>
      <StaffShell
        nav={destinations.map((each) => ({ ...each, current: isAt(each, path) }))}
        homeHref="/"
        person={person}
        theme={theme}
        lag={lag}
        signOut={<SignOutButton />}
      >
        {children}
      </StaffShell>
    </ToastProvider>
  );
}
