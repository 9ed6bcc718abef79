import { insertPerson } from '@/db/queries/people';
import type { Context } from '@/lib/context';
import type { CreatePerson, Person } from '@/lib/schemas/person';
import { requireFleetWide } from './access';
import { checkDocks } from './check-docks';
import { checkNewPassword } from './check-new-password';
import { hashPassword } from '@/lib/secrets/password-hash';
import { refusingTaken } from './refusing-taken';
import { toPerson } from './shape-person';

/**
 * Adds a person with a first password, for somebody who has no e-mail at hand; everybody else is invited.
 * Managers of all docks only. A manager gets the digest until they say otherwise.
 * Throws `invalid_input` on `password`, `conflict` on `email`, `not_found` on a dock.
 */
export async function createPerson(ctx: Context, input: CreatePerson): Promise<Person> {
  requireFleetWide(ctx, 'person.write');
  checkNewPassword(input.password, input.email);
  await checkDocks(ctx, input.dockIds ?? []);
  const passwordHash = await hashPassword(input.password);
  const row = await refusingTaken(
    { person_email: ['email', 'Somebody has this e-mail address already.'] },
    () =>
      insertPerson(ctx.db, {
        name: input.name,
        email: input.email,
        role: input.role,
        dock_ids: [...new Set(input.dockIds ?? [])],
        password_hash: passwordHash,
        digest_wanted: input.role === 'manager',
        created_at: ctx.now,
      }),
  );
  return toPerson(row);
}
