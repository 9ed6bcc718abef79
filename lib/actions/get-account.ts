import { findPerson } from '@/db/queries/people';
import type { Context } from '@/lib/context';
import { Refusal } from '@/lib/errors';
import type { Account } from '@/lib/schemas/account';
import { ownSelf } from './own-self';
import { toPerson } from './shape-person';

/** What the person who asks has set for themselves. */
export async function getAccount(ctx: Context): Promise<Account> {
  const row = await findPerson(ctx.db, ownSelf(ctx).personId);
  if (!row) throw new Refusal('not_found', 'There is no such account.');
  const { deactivatedAt: _, ...account } = toPerson(row);
  return account;
}
