import type { Kysely } from 'kysely';
import type { DB } from '../tables';

/** How many resets the person asked for since `since`. */
export async function countPasswordResets(db: Kysely<DB>, personId: string, since: Date): Promise<number> {
  const { asked } = await db
    .selectFrom('password_reset')
    .select((eb) => eb.fn.countAll<number>().as('asked'))
    .where('person_id', '=', personId)
    .where('asked_at', '>', since)
    .executeTakeFirstOrThrow();
  return asked;
}

/** The reset of this id, used or not. */
export function findPasswordResetById(db: Kysely<DB>, id: string): Promise<{ id: string } | undefined> {
  return db.selectFrom('password_reset').select('id').where('id', '=', id).executeTakeFirst();
}

/** Stores that the person may choose a new password until `expiresAt`; of the token its hash alone. */
export async function insertPasswordReset(
  db: Kysely<DB>,
  row: { id: string; personId: string; tokenHash: Buffer; now: Date; expiresAt: Date },
): Promise<void> {
  await db
    .insertInto('password_reset')
    .values({
      id: row.id,
      person_id: row.personId,
      token_hash: row.tokenHash,
      asked_at: row.now,
      expires_at: row.expiresAt,
    })
    .execute();
}

/** The active person whom this unused, unexpired token lets choose a new password. */
export function findPersonByResetToken(
  db: Kysely<DB>,
  tokenHash: Buffer,
  now: Date,
): Promise<{ id: string; name: string; email: string } | undefined> {
  return db
    .selectFrom('password_reset')
    .innerJoin('person', 'person.id', 'password_reset.person_id')
    .select(['person.id', 'person.name', 'person.email'])
    .where('password_reset.token_hash', '=', tokenHash)
    .where('password_reset.used_at', 'is', null)
    .where('password_reset.expires_at', '>', now)
    .where('person.deactivated_at', 'is', null)
    .executeTakeFirst();
}

/** Uses the token up, once; answers whether it was there to be used. */
export async function takePasswordReset(db: Kysely<DB>, tokenHash: Buffer, now: Date): Promise<boolean> {
  const row = await db
    .updateTable('password_reset')
    .set({ used_at: now })
    .where('token_hash', '=', tokenHash)
    .where('used_at', 'is', null)
    .where('expires_at', '>', now)
    .returning('id')
    .executeTakeFirst();
  return row !== undefined;
}

/** Makes every other token of the person worth nothing. */
export async function usePasswordResetsUp(db: Kysely<DB>, personId: string, now: Date): Promise<void> {
  await db
    .updateTable('password_reset')
    .set({ used_at: now })
    .where('person_id', '=', personId)
    .where('used_at', 'is', null)
    .execute();
}
