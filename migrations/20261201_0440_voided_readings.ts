import { sql, type Kysely } from 'kysely';

/** A unit's history shows voided readings too; an insert never touches this index. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    create index reading_unit_voided on reading (unit_id, taken_at desc) where voided_at is not null;
    create index defect_unit on defect (unit_id, reported_at desc);
    create index defect_reading on defect (reading_id) where reading_id is not null;
    create index lay_up_of_unit on lay_up (unit_id, from_on desc);
  `.execute(db);
}
