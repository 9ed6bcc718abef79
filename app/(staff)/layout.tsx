import { cookies } from 'next/headers';
import type { ReactNode } from 'react';
import { destinationsFor } from '@/components/shell/destinations';
import { StaffFrame } from '@/components/shell/StaffFrame';
import { workerStatus } from '@/lib/actions/worker-status';
import { pageContext } from '@/lib/auth/page';
import { parseTheme, themeCookie } from '@/lib/client/theme';

/** Seconds behind from which the worker's lag is shown: an ordinary job is done within two. */
const LAG_SHOWN_FROM = 15;

/** The frame of every signed-in screen. A page asks for its own context: a layout keeps nobody out. */
export default async function StaffLayout({ children }: { children: ReactNode }) {
  const ctx = await pageContext();
  const person = ctx.actor;
  const { lagSeconds } = await workerStatus(ctx);
  return (
    <StaffFrame
      destinations={destinationsFor(person)}
      person={{ name: person.name, role: person.role }}
      theme={parseTheme((await cookies()).get(themeCookie)?.value)}
      lag={lagSeconds >= LAG_SHOWN_FROM ? lagSeconds : null}
    >
      {children}
    </StaffFrame>
  );
}
