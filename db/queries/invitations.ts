import { sql, type Insertable, type Kysely, type Selectable } from 'kysely';
import type { DB, InvitationTable } from '../tables';

export type InvitationRow = Selectable<InvitationTable>;

/** Invitations neither accepted nor withdrawn, expired ones too, by name. */
export function listOpenInvitations(db: Kysely<DB>): Promise<InvitationRow[]> {
  return open(db)
    .orderBy(sql`lower(name)`)
    .orderBy('id')
    .execute();
}

/** The open invitation of this token's hash that has not expired. */
export function findInvitationByToken(
  db: Kysely<DB>,
  tokenHash: Buffer,
  now: Date,
): Promise<InvitationRow | undefined> {
  return open(db).where('token_hash', '=', tokenHash).where('expires_at', '>', now).executeTakeFirst();
}

/** Stores an invitation; of its token the hash alone. */
export function insertInvitation(db: Kysely<DB>, row: Insertable<InvitationTable>): Promise<InvitationRow> {
  return db.insertInto('invitation').values(row).returningAll().executeTakeFirstOrThrow();
}

/** Gives an open invitation a new token and a new end; the old token is worth nothing from then on. */
export function renewInvitation(
  db: Kysely<DB>,
  id: string,
  renewed: { token_hash: Buffer; expires_at: Date },
): Promise<InvitationRow | undefined> {
  return db
    .updateTable('invitation')
    .set(renewed)
    .where('id', '=', id)
    .where('accepted_at', 'is', null)
    .where('withdrawn_at', 'is', null)
    .returningAll()
    .executeTakeFirst();
}

/** Takes the invitation of this token, once: of two at the same time the second finds nothing. */
export function takeInvitation(
  db: Kysely<DB>,
  tokenHash: Buffer,
  now: Date,
): Promise<InvitationRow | undefined> {
  return db
    .updateTable('invitation')
    .set({ accepted_at: now })
    .where('token_hash', '=', tokenHash)
    .where('accepted_at', 'is', null)
    .where('withdrawn_at', 'is', null)
    .where('expires_at', '>', now)
    .returningAll()
    .executeTakeFirst();
}

/** Withdraws an open invitation; answers whether there was one. */
export async function withdrawInvitation(db: Kysely<DB>, id: string, now: Date): Promise<boolean> {
  const row = await db
    .updateTable('invitation')
    .set({ withdrawn_at: now })
    .where('id', '=', id)
    .where('accepted_at', 'is', null)
    .where('withdrawn_at', 'is', null)
    .returning('id')
    .executeTakeFirst();
  return row !== undefined;
}

/** Withdraws every open invitation that this person sent. */
export async function withdrawInvitationsOf(db: Kysely<DB>, personId: string, now: Date): Promise<void> {
  await db
    .updateTable('invitation')
    .set({ withdrawn_at: now })
    .where('invited_by', '=', personId)
    .where('accepted_at', 'is', null)
    .where('withdrawn_at', 'is', null)
    .execute();
}

function open(db: Kysely<DB>) {
  return db
    .selectFrom('invitation')
    .selectAll()
    .where('accepted_at', 'is', null)
    .where('withdrawn_at', 'is', null);
}
