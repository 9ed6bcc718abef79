import { withdrawInvitationsOf } from '@/db/queries/invitations';
import { changePerson as changePersonRow, lockManagersOfAllDocks } from '@/db/queries/people';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import type { ChangePerson, Person } from '@/lib/schemas/person';
import { accessPerson, requireFleetWide } from './access';
import { checkDocks } from './check-docks';
import { keepAManager } from './keep-a-manager';
import { toPerson } from './shape-person';

/**
 * Changes a person's name, role or docks. Managers of all docks only. Another role or other docks end the
 * person's sessions; whoever may no longer invite has the invitations they sent withdrawn. Throws `not_found` on
 * `id` or a dock, `conflict` on `role` or `dockIds` for the last manager of all docks.
 */
export async function changePerson(
  ctx: Context,
  { id, ...input }: ChangePerson & { id: string },
): Promise<Person> {
  requireFleetWide(ctx, 'person.write');
  await checkDocks(ctx, input.dockIds ?? []);
  return runTransaction(ctx.db, async (trx) => {
    // Every change of role or docks waits for the one before, so none is made from what is no longer so.
    await lockManagersOfAllDocks(trx);
    const before = await accessPerson({ ...ctx, db: trx }, id, 'person.write');
    const role = input.role ?? before.role;
    const dockIds = [...new Set(input.dockIds ?? before.dock_ids)];
    const moves = role !== before.role || !sameDocks(dockIds, before.dock_ids);
    const staysManagerOfAll = role === 'manager' && dockIds.length === 0;
    if (!staysManagerOfAll) {
      await keepAManager(trx, id, role === 'manager' ? 'dockIds' : 'role');
      await withdrawInvitationsOf(trx, id, ctx.now);
    }
    const change = {
      ...(input.name !== undefined && { name: input.name }),
      ...(input.role !== undefined && { role }),
      ...(input.dockIds !== undefined && { dock_ids: dockIds }),
      ...(role !== 'manager' && { digest_wanted: false }),
    };
    return toPerson(await changePersonRow(trx, id, change, { endSessions: moves }));
  });
}

function sameDocks(left: readonly string[], right: readonly string[]): boolean {
  return left.length === right.length && left.every((id) => right.includes(id));
}
