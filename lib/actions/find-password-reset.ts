import { findPersonByResetToken } from '@/db/queries/password-resets';
import type { Context } from '@/lib/context';
import { hashToken } from '@/lib/secrets/one-time-token';

/** Whose password a link lets be chosen, or null when it works no more. Whoever holds the link may ask. */
export async function findPasswordReset(
  ctx: Pick<Context, 'db' | 'now'>,
  { token }: { token: string },
): Promise<{ email: string } | null> {
  const person = await findPersonByResetToken(ctx.db, hashToken(token), ctx.now);
  return person ? { email: person.email } : null;
}
