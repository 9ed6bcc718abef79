import {
  sql,
  type Insertable,
  type Kysely,
  type Selectable,
  type Transaction,
  type Updateable,
} from 'kysely';
import type { DB, PersonTable } from '../tables';

/** What of a person decides what they may do. */
export type SignedInRow = Pick<Selectable<PersonTable>, 'id' | 'name' | 'email' | 'role' | 'dock_ids'>;

const PERSON = [
  'id',
  'name',
  'email',
  'role',
  'dock_ids',
  'digest_wanted',
  'session_version',
  'deactivated_at',
] as const;

/** A person without their password. */
export type PersonRow = Pick<Selectable<PersonTable>, (typeof PERSON)[number]>;

/** What a sign-in compares with. */
export type CredentialRow = Pick<
  Selectable<PersonTable>,
  'id' | 'email' | 'password_hash' | 'session_version' | 'deactivated_at'
>;

/** Everybody, those who work here now first, by name. */
export function listPeople(db: Kysely<DB>): Promise<PersonRow[]> {
  return db
    .selectFrom('person')
    .select(PERSON)
    .orderBy(sql`deactivated_at is not null`)
    .orderBy(sql`lower(name)`)
    .orderBy('id')
    .execute();
}

/** The person of this id, deactivated or not. */
export function findPerson(db: Kysely<DB>, id: string): Promise<PersonRow | undefined> {
  return db.selectFrom('person').select(PERSON).where('id', '=', id).executeTakeFirst();
}

/** The person with this e-mail address, in any case. */
export function findCredentialByEmail(db: Kysely<DB>, email: string): Promise<CredentialRow | undefined> {
  return credentials(db)
    .where(sql<string>`lower(email)`, '=', email.toLowerCase())
    .executeTakeFirst();
}

/** What a password of this person is compared with. */
export function findCredential(db: Kysely<DB>, id: string): Promise<CredentialRow | undefined> {
  return credentials(db).where('id', '=', id).executeTakeFirst();
}

/** Stores a person. The index `person_email` keeps addresses apart, in any case. */
export function insertPerson(db: Kysely<DB>, row: Insertable<PersonTable>): Promise<PersonRow> {
  return db.insertInto('person').values(row).returning(PERSON).executeTakeFirstOrThrow();
}

/** Writes what is named. With `endSessions` every session of the person ends, whatever else it says. */
export function changePerson(
  db: Kysely<DB>,
  id: string,
  change: Updateable<PersonTable>,
  { endSessions = false } = {},
): Promise<PersonRow> {
  return db
    .updateTable('person')
    .set((eb) => ({
      ...change,
      ...(endSessions && { session_version: eb('session_version', '+', 1) }),
    }))
    .where('id', '=', id)
    .returning(PERSON)
    .executeTakeFirstOrThrow();
}

/** Locks the person against every other writer of them until the transaction ends. */
export async function lockPerson(trx: Transaction<DB>, id: string): Promise<void> {
  await trx.selectFrom('person').select('id').where('id', '=', id).forUpdate().execute();
}

/** Locks the active managers of all docks, so that two of them cannot take the right away from each other. */
export async function lockManagersOfAllDocks(trx: Transaction<DB>): Promise<string[]> {
  const rows = await trx
    .selectFrom('person')
    .select('id')
    .where('role', '=', 'manager')
    .where('deactivated_at', 'is', null)
    .where(sql<boolean>`dock_ids = '{}'`)
    .orderBy('id')
    .forUpdate()
    .execute();
  return rows.map((row) => row.id);
}

function credentials(db: Kysely<DB>) {
  return db
    .selectFrom('person')
    .select(['id', 'email', 'password_hash', 'session_version', 'deactivated_at']);
}
