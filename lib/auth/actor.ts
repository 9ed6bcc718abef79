import { createHash } from 'node:crypto';
import type { Kysely } from 'kysely';
import { findPersonByApiKey } from '@/db/queries/api-keys';
import type { SignedInRow } from '@/db/queries/people';
import { findPersonBySession } from '@/db/queries/sessions';
import type { DB } from '@/db/tables';
import type { PersonActor } from '@/lib/domain/access';
import { env } from '@/lib/env';
import { readCookie, sessionCookieName } from './cookies';
import { readSessionToken } from './session-token';

/**
 * Who sends this request: the owner of the API key in `Authorization: Bearer`, else the person of the session in
 * the cookie. Asked of the database at every request, in one round trip, so that a person who signed out, was
 * deactivated or was given another role loses access at their next one. Null when nobody is signed in.
 */
export async function findActor(
  db: Kysely<DB>,
  headers: Headers,
  now: Date = new Date(),
): Promise<PersonActor | null> {
  const authorization = headers.get('authorization');
  if (authorization !== null) return findActorByKey(db, authorization, now);
  const sessionId = findSessionId(headers, now);
  if (!sessionId) return null;
  const row = await findPersonBySession(db, sessionId, now);
  return row ? toActor(row, sessionId) : null;
}

/** The id of the session whose cookie we signed, whether or not it has ended since. */
export function findSessionId(headers: Headers, now: Date): string | null {
  const cookie = readCookie(headers.get('cookie'), sessionCookieName());
  return cookie ? (readSessionToken(cookie, env().AUTH_SECRET, now)?.sessionId ?? null) : null;
}

async function findActorByKey(db: Kysely<DB>, authorization: string, now: Date): Promise<PersonActor | null> {
  const key = /^Bearer (\S{20,200})$/i.exec(authorization)?.[1];
  if (!key) return null;
  const row = await findPersonByApiKey(db, createHash('sha256').update(key).digest(), now);
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
