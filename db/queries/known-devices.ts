import type { Kysely } from 'kysely';
import type { DB } from '../tables';

/** The id of a device on which the person of this hash has signed in and that has not expired. */
export async function findKnownDevice(
  db: Kysely<DB>,
  tokenHash: Buffer,
  now: Date,
): Promise<string | undefined> {
  const row = await db
    .selectFrom('known_device')
    .select('id')
    .where('token_hash', '=', tokenHash)
    .where('expires_at', '>', now)
    .executeTakeFirst();
  return row?.id;
}

/** Remembers the device, or that it is still in use. */
export async function upsertKnownDevice(
  db: Kysely<DB>,
  row: { personId: string; tokenHash: Buffer; now: Date; expiresAt: Date },
): Promise<void> {
  await db
    .insertInto('known_device')
    .values({
      person_id: row.personId,
      token_hash: row.tokenHash,
      created_at: row.now,
      expires_at: row.expiresAt,
    })
    .onConflict((conflict) => conflict.column('token_hash').doUpdateSet({ expires_at: row.expiresAt }))
    .execute();
}

/** Forgets every device of the person: their next sign-in counts as one from a browser never seen. */
export async function expireKnownDevices(db: Kysely<DB>, personId: string, now: Date): Promise<void> {
  await db
    .updateTable('known_device')
    .set({ expires_at: now })
    .where('person_id', '=', personId)
    .where('expires_at', '>', now)
    .execute();
}
