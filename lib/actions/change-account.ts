import { changePerson } from '@/db/queries/people';
import type { Context } from '@/lib/context';
import { canSomewhere } from '@/lib/domain/access';
import { refuseField } from '@/lib/errors';
import type { Account, ChangeAccount } from '@/lib/schemas/account';
import { ownSelf } from './own-self';
import { toPerson } from './shape-person';

/** Changes one's own name and whether one wants the digest. Throws `forbidden` on `digestWanted` unless a manager. */
export async function changeAccount(ctx: Context, input: ChangeAccount): Promise<Account> {
  const self = ownSelf(ctx);
  if (input.digestWanted && !canSomewhere(self, 'digest.read')) {
    throw refuseField('digestWanted', 'The digest is for managers.', 'forbidden');
  }
  const row = await changePerson(ctx.db, self.personId, {
    ...(input.name !== undefined && { name: input.name }),
    ...(input.digestWanted !== undefined && { digest_wanted: input.digestWanted }),
  });
  const { deactivatedAt: _, ...account } = toPerson(row);
  return account;
}
