import { changePerson } from '@/db/queries/people';
import type { Context } from '@/lib/context';
import type { Person } from '@/lib/schemas/person';
import { accessPerson } from './access';
import { toPerson } from './shape-person';

/** Lets a deactivated person sign in again, as what they were. Managers of all docks only. Throws `not_found` on `id`. */
export async function reactivatePerson(ctx: Context, { id }: { id: string }): Promise<Person> {
  const before = await accessPerson(ctx, id, 'person.write');
  if (!before.deactivated_at) return toPerson(before);
  return toPerson(await changePerson(ctx.db, id, { deactivated_at: null, deactivated_by: null }));
}
