import { sql, type Kysely, type Selectable } from 'kysely';
import type { ApiKeyTable, DB } from '../tables';
import type { SignedInRow } from './people';

export type ApiKeyRow = Omit<Selectable<ApiKeyTable>, 'key_hash' | 'revoked_at'>;

const API_KEY = ['id', 'person_id', 'name', 'prefix', 'created_at', 'last_used_at'] as const;

/**
 * The active owner of an API key that is not revoked, by the key's SHA-256. Notes the use in the same round trip,
 * unless one was noted within the last minute.
 */
export async function findPersonByApiKey(
  db: Kysely<DB>,
  keyHash: Buffer,
  now: Date,
): Promise<SignedInRow | undefined> {
  const { rows } = await sql<SignedInRow>`
    with used as (
      update api_key set last_used_at = ${now}::timestamptz
      where key_hash = ${keyHash} and revoked_at is null
        and (last_used_at is null or last_used_at < ${now}::timestamptz - interval '1 minute')
    )
    select person.id, person.name, person.email, person.role, person.dock_ids
    from api_key join person on person.id = api_key.person_id
    where api_key.key_hash = ${keyHash} and api_key.revoked_at is null and person.deactivated_at is null`.execute(
    db,
  );
  return rows[0];
}

/** The person's keys that are not revoked, newest first. */
export function listApiKeys(db: Kysely<DB>, personId: string): Promise<ApiKeyRow[]> {
  return db
    .selectFrom('api_key')
    .select(API_KEY)
    .where('person_id', '=', personId)
    .where('revoked_at', 'is', null)
    .orderBy('created_at', 'desc')
    .orderBy('id')
    .execute();
}

/** Stores a key of a person; of the key itself its hash and the first letters alone. */
export function insertApiKey(
  db: Kysely<DB>,
  row: { personId: string; name: string; prefix: string; keyHash: Buffer; now: Date },
): Promise<ApiKeyRow> {
  return db
    .insertInto('api_key')
    .values({
      person_id: row.personId,
      name: row.name,
      prefix: row.prefix,
      key_hash: row.keyHash,
      created_at: row.now,
    })
    .returning(API_KEY)
    .executeTakeFirstOrThrow();
}

/** Revokes the person's own key; answers whether there was one. */
export async function revokeApiKey(
  db: Kysely<DB>,
  key: { id: string; personId: string },
  now: Date,
): Promise<boolean> {
  const row = await db
    .updateTable('api_key')
    .set({ revoked_at: now })
    .where('id', '=', key.id)
    .where('person_id', '=', key.personId)
    .where('revoked_at', 'is', null)
    .returning('id')
    .executeTakeFirst();
  return row !== undefined;
}
