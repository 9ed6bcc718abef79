import type { Kysely, Selectable } from 'kysely';
import type { DB, PersonTable } from '../tables';

/** What of a person decides what they may do. */
export type SignedInRow = Pick<Selectable<PersonTable>, 'id' | 'name' | 'email' | 'role' | 'dock_ids'>;

/** The active owner of an API key that is not revoked, by the key's SHA-256. */
export function findPersonByApiKey(db: Kysely<DB>, keyHash: Buffer): Promise<SignedInRow | undefined> {
  return db
    .selectFrom('api_key')
    .innerJoin('person', 'person.id', 'api_key.person_id')
    .select(['person.id', 'person.name', 'person.email', 'person.role', 'person.dock_ids'])
    .where('api_key.key_hash', '=', keyHash)
    .where('api_key.revoked_at', 'is', null)
    .where('person.deactivated_at', 'is', null)
    .executeTakeFirst();
}
