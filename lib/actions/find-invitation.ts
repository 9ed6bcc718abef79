import { findInvitationByToken } from '@/db/queries/invitations';
import { findOperator } from '@/db/queries/operator';
import type { Context } from '@/lib/context';
import { hashToken } from '@/lib/secrets/one-time-token';

export type Invited = { name: string; email: string; operatorName: string };

/** Whom the link of an invitation is for, or null when it works no more. Whoever holds the link may ask. */
export async function findInvitation(
  ctx: Pick<Context, 'db' | 'now'>,
  { token }: { token: string },
): Promise<Invited | null> {
  const row = await findInvitationByToken(ctx.db, hashToken(token), ctx.now);
  if (!row) return null;
  const operator = await findOperator(ctx.db);
  return { name: row.name, email: row.email, operatorName: operator?.name ?? 'Wakewright' };
}
