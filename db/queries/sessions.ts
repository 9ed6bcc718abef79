import { sql, type Kysely } from 'kysely';
import type { DB } from '../tables';
import type { SignedInRow } from './people';

/** The person of a session that has not ended or expired and is of the person's present version. One round trip. */
export function findPersonBySession(
  db: Kysely<DB>,
  sessionId: string,
  now: Date,
): Promise<SignedInRow | undefined> {
  return db
    .selectFrom('session')
    .innerJoin('person', (join) =>
      join
        .onRef('person.id', '=', 'session.person_id')
        .onRef('person.session_version', '=', 'session.session_version'),
    )
    .select(['person.id', 'person.name', 'person.email', 'person.role', 'person.dock_ids'])
    .where('session.id', '=', sessionId)
    .where('session.ended_at', 'is', null)
    .where('session.expires_at', '>', now)
    .where('person.deactivated_at', 'is', null)
    .modifyEnd(sql`/* prepared */`)
    .executeTakeFirst();
}

/** Begins a session and answers its id. */
export async function insertSession(
  db: Kysely<DB>,
  row: { personId: string; version: number; now: Date; expiresAt: Date },
): Promise<string> {
  const { id } = await db
    .insertInto('session')
    .values({
      person_id: row.personId,
      session_version: row.version,
      created_at: row.now,
      expires_at: row.expiresAt,
    })
    .returning('id')
    .executeTakeFirstOrThrow();
  return id;
}

/** Ends one session; one that has ended keeps its first end. */
export async function endSession(db: Kysely<DB>, sessionId: string, now: Date): Promise<void> {
  await db
    .updateTable('session')
    .set({ ended_at: now })
    .where('id', '=', sessionId)
    .where('ended_at', 'is', null)
    .execute();
}

/** Lets one session live on under the person's new version, when all others are to end. */
export async function renewSession(db: Kysely<DB>, sessionId: string, version: number): Promise<void> {
  await db.updateTable('session').set({ session_version: version }).where('id', '=', sessionId).execute();
}
