import type { Kysely } from 'kysely';
import type { DB } from '@/db/tables';
import { createPerson } from '@/lib/actions/create-person';
import type { Context } from '@/lib/context';
import type { Actor, Role } from '@/lib/domain/access';
import type { Person } from '@/lib/schemas/person';

/** Of every sign-in of the demo; loaded into the demo only. */
export const DEMO_PASSWORD = 'three-docks-afloat';

export const DEMO_MANAGER = { name: 'Oriel Vance', email: 'manager@wakewright.example' };

/** Everybody but the manager. `dock` is a place in the list of docks; without one they work at all of them. */
const CREW: readonly { name: string; email: string; role: Role; dock?: number }[] = [
  { name: 'Teodor Brask', email: 'mechanic@wakewright.example', role: 'mechanic' },
  { name: 'Wren Calloway', email: 'dock@wakewright.example', role: 'dock', dock: 0 },
  { name: 'Ilse Marrable', email: 'ilse.marrable@wakewright.example', role: 'mechanic', dock: 1 },
  { name: 'Jonah Pell', email: 'jonah.pell@wakewright.example', role: 'dock', dock: 0 },
  { name: 'Dovie Harrow', email: 'dovie.harrow@wakewright.example', role: 'dock', dock: 1 },
  { name: 'Bastian Quoyle', email: 'bastian.quoyle@wakewright.example', role: 'dock', dock: 2 },
];

/** Who acts at one dock. */
export type Crew = { manager: Actor; mechanic: Actor; hands: readonly Actor[] };

const asActor = ({ id, name, email, role, dockIds }: Person): Actor => ({
  kind: 'person',
  personId: id,
  sessionId: null,
  name,
  email,
  role,
  dockIds,
});

/** Adds the crew with their password, and answers who works at each of these docks, in their order. */
export async function addCrew(
  db: Kysely<DB>,
  manager: Person,
  dockIds: readonly string[],
  now: Date,
): Promise<Crew[]> {
  const ctx: Context = { db, actor: asActor(manager), now };
  const people: Actor[] = [];
  for (const { dock, ...person } of CREW) {
    const where = dock === undefined ? {} : { dockIds: [dockIds[dock]!] };
    people.push(asActor(await createPerson(ctx, { ...person, ...where, password: DEMO_PASSWORD })));
  }
  return dockIds.map((dockId) => {
    const here = (role: Role) =>
      people.filter((actor) => actor.kind === 'person' && actor.role === role && worksHere(actor.dockIds));
    const worksHere = (ids: readonly string[]) => ids.length === 0 || ids.includes(dockId);
    return { manager: ctx.actor, mechanic: here('mechanic').at(-1)!, hands: here('dock') };
  });
}
