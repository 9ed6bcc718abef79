import { cookies } from 'next/headers';
import type { ReactNode } from 'react';
import { destinationsFor } from '@/components/shell/destinations';
import { StaffFrame } from '@/components/shell/StaffFrame';
import { workerStatus } from '@/lib/actions/worker-status';
import { pageContext } from '@/lib/auth/page';
import { parseTheme, themeCookie } from '@/lib/client/theme';

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
      lagSeconds={lagSeconds}
    >
      {children}
    </StaffFrame>
  );
}
