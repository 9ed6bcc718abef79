'use client';

import { usePathname } from 'next/navigation';
import type { ReactNode } from 'react';
import { SignOutButton } from '@/components/account/SignOutButton';
import { ToastProvider } from '@/components/ui/Toast';
import type { Theme } from '@/lib/client/theme';
import { useLag } from '@/lib/client/use-lag';
import { isAt, type Destination } from './destinations';
import { StaffShell } from './StaffShell';

/** Seconds behind from which the worker's lag is shown: an ordinary job is done within two. */
const LAG_SHOWN_FROM = 15;

/** The shell with the present destination marked: a layout is not drawn again when one goes from page to page. */
export function StaffFrame({
  destinations,
  person,
  theme,
  lagSeconds,
  children,
}: {
  destinations: Destination[];
  person: { name: string; role: string };
  theme: Theme;
  lagSeconds: number;
  children: ReactNode;
}) {
  const path = usePathname();
  const lag = useLag(lagSeconds);
  return (
    <ToastProvider>
      <StaffShell
        nav={destinations.map((each) => ({ ...each, current: isAt(each, path) }))}
        homeHref="/"
        person={person}
        theme={theme}
        lag={lag >= LAG_SHOWN_FROM ? lag : null}
        signOut={<SignOutButton />}
      >
        {children}
      </StaffShell>
    </ToastProvider>
  );
}
