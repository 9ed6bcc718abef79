import type { Context } from '@/lib/context';
import type { Person } from '@/lib/schemas/person';
import { accessPerson } from './access';
import { toPerson } from './shape-person';

/** One person. Managers of all docks only. Throws `not_found` on `id`. */
export async function getPerson(ctx: Context, { id }: { id: string }): Promise<Person> {
  return toPerson(await accessPerson(ctx, id, 'person.read'));
}
