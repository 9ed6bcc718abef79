import { withdrawInvitationsOf } from '@/db/queries/invitations';
import { changePerson } from '@/db/queries/people';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import type { Person } from '@/lib/schemas/person';
import { accessPerson } from './access';
import { keepAManager } from './keep-a-manager';
import { toPerson } from './shape-person';

/**
 * Takes a person's access away from their next request on, and withdraws the invitations they sent; what they
 * recorded stays theirs. Managers of all docks only. Somebody deactivated already stays so. Throws `not_found` or
 * `conflict` on `id`.
 */
export async function deactivatePerson(ctx: Context, { id }: { id: string }): Promise<Person> {
  return runTransaction(ctx.db, async (trx) => {
    const before = await accessPerson({ ...ctx, db: trx }, id, 'person.write');
    if (before.deactivated_at) return toPerson(before);
    await keepAManager(trx, id, 'id');
    await withdrawInvitationsOf(trx, id, ctx.now);
    const by = ctx.actor.kind === 'person' ? ctx.actor.personId : null;
    const change = { deactivated_at: ctx.now, deactivated_by: by };
    return toPerson(await changePerson(trx, id, change, { endSessions: true }));
  });
}
