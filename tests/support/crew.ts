import { createHash, randomBytes } from 'node:crypto';
import type { Kysely } from 'kysely';
import type { DB } from '@/db/tables';
import { SYSTEM, type PersonActor, type Role } from '@/lib/domain/access';
import type { Context } from '@/lib/context';

/** What the system is asked to do at an instant. */
export function asSystem(db: Kysely<DB>, now: Date): Context {
  return { db, actor: SYSTEM, now };
}

export type Member = { actor: PersonActor; key: string; as(now: Date): Context };

/** A person of a role, at all docks unless some are named, with an API key to call with. */
export async function addPerson(db: Kysely<DB>, role: Role, dockIds: string[] = []): Promise<Member> {
  const key = randomBytes(24).toString('base64url');
  const email = `${role}-${key.slice(0, 8).toLowerCase()}@example.test`;
  const { id } = await db
    .insertInto('person')
    .values({ email, name: `A ${role}`, role, dock_ids: dockIds, password_hash: null, deactivated_by: null })
    .returning('id')
    .executeTakeFirstOrThrow();
  await db
    .insertInto('api_key')
    .values({
      person_id: id,
      name: 'test',
      prefix: key.slice(0, 6),
      key_hash: createHash('sha256').update(key).digest(),
    })
    .execute();
  const actor: PersonActor = {
    kind: 'person',
    personId: id,
    sessionId: null,
    name: `A ${role}`,
    email,
    role,
    dockIds,
  };
  return { actor, key, as: (now) => ({ db, actor, now }) };
}
