import { sql, type Kysely, type Selectable, type Transaction } from 'kysely';
import type { CalendarDay } from '@/lib/domain/calendar-day';
import type { DB, PersonTable } from '../tables';

const READER = ['id', 'name', 'email', 'role', 'dock_ids', 'digest_wanted', 'unsubscribe_key'] as const;

/** Somebody who may get the digest, with the key that ends it. */
export type DigestReader = Pick<Selectable<PersonTable>, (typeof READER)[number]>;

const readers = (db: Kysely<DB>) =>
  db.selectFrom('person').select(READER).where('deactivated_at', 'is', null);

/** The managers who want the digest. */
export function listDigestReaders(db: Kysely<DB>): Promise<DigestReader[]> {
  return readers(db).where('digest_wanted', '=', true).where('role', '=', 'manager').orderBy('id').execute();
}

/** The person as a reader of the digest, of whatever role; nobody who is deactivated. */
export function findDigestReader(db: Kysely<DB>, personId: string): Promise<DigestReader | undefined> {
  return readers(db).where('id', '=', personId).executeTakeFirst();
}

/** Lets nobody else send to this person until the transaction ends. */
export async function lockDigestReader(
  trx: Transaction<DB>,
  personId: string,
): Promise<DigestReader | undefined> {
  return readers(trx).where('id', '=', personId).forUpdate().executeTakeFirst();
}

/** The weeks from `from` on for which a person's digest is there already, as 'person week'. */
export async function listDigestWeeks(db: Kysely<DB>, from: CalendarDay): Promise<Set<string>> {
  const rows = await db
    .selectFrom('digest')
    .select(['person_id', 'week_on'])
    .where('week_on', '>=', from)
    .execute();
  return new Set(rows.map((row) => `${row.person_id} ${row.week_on}`));
}

/** Takes the week's digest of a person in hand. Undefined when that was done before: there is one a week. */
export async function insertDigest(
  trx: Transaction<DB>,
  row: { personId: string; weekOn: CalendarDay; now: Date },
): Promise<string | undefined> {
  const inserted = await trx
    .insertInto('digest')
    .values({ person_id: row.personId, week_on: row.weekOn, claimed_at: row.now })
    .onConflict((oc) => oc.columns(['person_id', 'week_on']).doNothing())
    .returning('id')
    .executeTakeFirst();
  return inserted?.id;
}

/** Records which letter the digest became. */
export async function insertDigestMail(
  trx: Transaction<DB>,
  digestId: string,
  mailId: string,
): Promise<void> {
  await trx.updateTable('digest').set({ mail_id: mailId }).where('id', '=', digestId).execute();
}

/** How many digests were sent to an address since an instant, asked for or weekly. */
export async function countDigestMails(db: Kysely<DB>, recipient: string, since: Date): Promise<number> {
  const { count } = await db
    .selectFrom('mail')
    .select(sql<number>`count(*)::int`.as('count'))
    .where('kind', '=', 'digest')
    .where('recipient', '=', recipient)
    .where('queued_at', '>', since)
    .executeTakeFirstOrThrow();
  return count;
}

/** Ends the digest for whoever holds this key. Answers whether anybody does; a second time is no different. */
export async function endDigestByKey(db: Kysely<DB>, key: string): Promise<boolean> {
  const { numUpdatedRows } = await db
    .updateTable('person')
    .set({ digest_wanted: false })
    .where('unsubscribe_key', '=', key)
    .executeTakeFirstOrThrow();
  return numUpdatedRows === 1n;
}
