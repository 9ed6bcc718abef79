import { sql, type Insertable, type Kysely, type Selectable } from 'kysely';
import type { DB, MailTable } from '../tables';

/** Stores a letter that is to be sent and answers its id. */
export async function insertMail(db: Kysely<DB>, row: Insertable<MailTable>): Promise<string> {
  const { id } = await db.insertInto('mail').values(row).returning('id').executeTakeFirstOrThrow();
  return id;
}

export type MailRow = Selectable<MailTable>;

/*
 * A claim says which run has a letter in hand. It is timed by the database's clock, the only one that the workers
 * of several machines share, and ends by itself `claimMs` after it was last renewed.
 */
const claimOver = (claimMs: number) =>
  sql<boolean>`(claimed_at is null or claimed_at < clock_timestamp() - ${claimMs} * interval '1 millisecond')`;

/** Takes the letter in hand under a new claim; nothing when it is sent, failed for good, or in another's hand. */
export async function claimMail(
  db: Kysely<DB>,
  { mailId, claimId, claimMs }: { mailId: string; claimId: string; claimMs: number },
): Promise<MailRow | undefined> {
  return db
    .updateTable('mail')
    .set({ claim_id: claimId, claimed_at: sql`clock_timestamp()` })
    .where('id', '=', mailId)
    .where('sent_at', 'is', null)
    .where('failure', 'is', null)
    .where(claimOver(claimMs))
    .returningAll()
    .executeTakeFirst();
}

/** Keeps the claim alive. False when it ended and another run has the letter. */
export async function renewMailClaim(db: Kysely<DB>, mailId: string, claimId: string): Promise<boolean> {
  const { numUpdatedRows } = await db
    .updateTable('mail')
    .set({ claimed_at: sql`clock_timestamp()` })
    .where('id', '=', mailId)
    .where('claim_id', '=', claimId)
    .executeTakeFirstOrThrow();
  return numUpdatedRows === 1n;
}

/** Gives the letter back, to be sent later; nothing happens when another run has it. */
export async function releaseMailClaim(db: Kysely<DB>, mailId: string, claimId: string): Promise<void> {
  await db
    .updateTable('mail')
    .set({ claim_id: null, claimed_at: null })
    .where('id', '=', mailId)
    .where('claim_id', '=', claimId)
    .execute();
}

/** The letter of this id, sent or not. */
export function findMail(db: Kysely<DB>, mailId: string): Promise<MailRow | undefined> {
  return db.selectFrom('mail').selectAll().where('id', '=', mailId).executeTakeFirst();
}

/**
 * Records that the server took the letter, on the digest it carries too, and forgets what it said: it may carry a
 * link that lets somebody in. The first time stays.
 */
export async function insertMailSent(db: Kysely<DB>, mailId: string, now: Date): Promise<void> {
  await sql`
    with sent as (
      update mail set sent_at = ${now}, text_body = '', html_body = null
       where id = ${mailId} and sent_at is null returning id)
    update digest set sent_at = ${now} from sent where digest.mail_id = sent.id`.execute(db);
}

/** Records that the letter will never be sent, and why, on the digest it carries too, and forgets what it said. */
export async function insertMailFailure(
  db: Kysely<DB>,
  { mailId, claimId, why }: { mailId: string; claimId: string; why: string },
): Promise<void> {
  await sql`
    with failed as (
      update mail set failure = ${why}, text_body = '', html_body = null
       where id = ${mailId} and claim_id = ${claimId} and sent_at is null and failure is null returning id)
    update digest set failure = ${why} from failed where digest.mail_id = failed.id`.execute(db);
}
