import { sql, type Kysely } from 'kysely';

/** A unit's history also shows what was voided or reversed, which the other indexes leave out. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create index outing_of_unit_voided on outing (unit_id) where voided_at is not null;
    create index closure_of_unit_reversed on closure (unit_id) where reversed_at is not null;
  `.execute(db);
}
