import { listPeople as listPersonRows } from '@/db/queries/people';
import type { Context } from '@/lib/context';
import type { Person } from '@/lib/schemas/person';
import { requireFleetWide } from './access';
import { toPerson } from './shape-person';

/** Everybody by name, deactivated people last. Managers of all docks only. */
export async function listPeople(ctx: Context): Promise<Person[]> {
  requireFleetWide(ctx, 'person.read');
  return (await listPersonRows(ctx.db)).map(toPerson);
}
