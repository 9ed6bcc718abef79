import type { Insertable, Kysely, Selectable, Transaction } from 'kysely';
import type { DB, OutingTable } from '../tables';

export type OutingRow = Selectable<OutingTable>;

/** The outing of this id, void or not. */
export function findOuting(db: Kysely<DB>, id: string): Promise<OutingRow | undefined> {
  return db.selectFrom('outing').selectAll().where('id', '=', id).executeTakeFirst();
}

/** The outing that the unit is on now. */
export function findOpenOuting(db: Kysely<DB>, unitId: string): Promise<OutingRow | undefined> {
  return db
    .selectFrom('outing')
    .selectAll()
    .where('unit_id', '=', unitId)
    .where('ended_at', 'is', null)
    .where('voided_at', 'is', null)
    .executeTakeFirst();
}

/** When the unit's last outing ended, or null. */
export async function findLastReturn(db: Kysely<DB>, unitId: string): Promise<Date | null> {
  const row = await db
    .selectFrom('outing')
    .select((eb) => eb.fn.max('ended_at').as('at'))
    .where('unit_id', '=', unitId)
    .where('voided_at', 'is', null)
    .executeTakeFirst();
  return row?.at ?? null;
}

/** Stores an outing and answers it. The caller makes its id. */
export function insertOuting(trx: Transaction<DB>, row: Insertable<OutingTable>): Promise<OutingRow> {
  return trx.insertInto('outing').values(row).returningAll().executeTakeFirstOrThrow();
}

/** Marks an outing void: it never happened, and counts no more. */
export async function voidOuting(
  trx: Transaction<DB>,
  id: string,
  voided: { at: Date; by: string | null; reason: string },
): Promise<void> {
  await trx
    .updateTable('outing')
    .set({ voided_at: voided.at, voided_by: voided.by, void_reason: voided.reason })
    .where('id', '=', id)
    .where('voided_at', 'is', null)
    .execute();
}
