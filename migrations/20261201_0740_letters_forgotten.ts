import { sql, type Kysely } from 'kysely';

/** What sent and failed letters said is forgotten: some carry a link that lets somebody in. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql`
    update mail set text_body = '', html_body = null where sent_at is not null or failure is not null
  `.execute(db);
}
