import { createHash } from 'node:crypto';
import type { Kysely } from 'kysely';
import type { DB } from '@/db/tables';
import { findPersonByApiKey, type SignedInRow } from '@/db/queries/people';
import type { PersonActor } from '@/lib/domain/access';

/**
 * Who sends this request: the owner of the API key in `Authorization: Bearer`. Asked of the database
 * at every request, so that a person who was deactivated or given another role loses access at their next one.
 * Null when nobody is signed in.
 */
export async function findActor(db: Kysely<DB>, headers: Headers): Promise<PersonActor | null> {
  const bearer = /^Bearer (\S{20,200})$/.exec(headers.get('authorization') ?? '')?.[1];
  if (!bearer) return null;
  const row = await findPersonByApiKey(db, createHash('sha256').update(bearer).digest());
  return row ? toActor(row, null) : null;
}

function toActor(row: SignedInRow, sessionId: string | null): PersonActor {
  return {
    kind: 'person',
    personId: row.id,
    sessionId,
    name: row.name,
    email: row.email,
    role: row.role,
    dockIds: row.dock_ids,
  };
}
