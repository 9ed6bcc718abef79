import { expireKnownDevices } from '@/db/queries/known-devices';
import { changePerson } from '@/db/queries/people';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { ownSelf } from './own-self';

/** Signs the person out everywhere, here too, and forgets the devices they are known on. Not for an API key. */
export async function endOwnSessions(ctx: Context): Promise<void> {
  const self = ownSelf(ctx, { signedIn: true });
  await runTransaction(ctx.db, async (trx) => {
    await expireKnownDevices(trx, self.personId, ctx.now);
    await changePerson(trx, self.personId, {}, { endSessions: true });
  });
}
