import { sql, type Kysely } from 'kysely';
import { createPerson } from '@/lib/actions/create-person';
import { sendPasswordReset } from '@/lib/actions/send-password-reset';
import { SYSTEM, type Role } from '@/lib/domain/access';
import type { DB } from '@/db/tables';
import { jobs } from '@/lib/schemas/jobs';
import type { Person } from '@/lib/schemas/person';

/** What everybody in the tests signs in with. */
export const PASSWORD = 'six knots at slack water';

/** Adds somebody who can sign in with `PASSWORD`, and the operator they work for. */
export async function addStaff(
  db: Kysely<DB>,
  name: string,
  role: Role,
  dockIds: string[] = [],
): Promise<Person> {
  await db
    .insertInto('operator')
    .values({ name: 'Harbour Test Hire' })
    .onConflict((conflict) => conflict.doNothing())
    .execute();
  const email = `${name.toLowerCase()}@wakewright.example`;
  return createPerson(
    { db, actor: SYSTEM, now: new Date() },
    { name, email, role, dockIds, password: PASSWORD },
  );
}

/** Does what the worker would about the links for a new password that were asked for, where no worker runs. */
export async function sendAskedResets(db: Kysely<DB>, now = new Date()): Promise<void> {
  const { rows } = await sql<{ id: string; payload: unknown }>`
    select job.id, job.payload from graphile_worker._private_jobs job
      join graphile_worker._private_tasks task on task.id = job.task_id
     where task.identifier = 'send-password-reset' order by job.id`.execute(db);
  for (const { id, payload } of rows) {
    await sendPasswordReset({ db, actor: SYSTEM, now }, jobs['send-password-reset'].parse(payload));
    await sql`select graphile_worker.complete_jobs(array[${id}::bigint])`.execute(db);
  }
}

/** The token of the link in the newest letter of this kind to this address. */
export async function tokenInLetter(db: Kysely<DB>, kind: string, to: string): Promise<string> {
  const letter = await db
    .selectFrom('mail')
    .select(['text_body', 'html_body'])
    .where('kind', '=', kind)
    .where('recipient', '=', to)
    .orderBy('queued_at', 'desc')
    .executeTakeFirstOrThrow();
  const token = /\/(?:invitation|reset)\/([\w-]{43})\s/.exec(letter.text_body)?.[1];
  if (!token || !letter.html_body?.includes(token)) throw new Error(`no link in: ${letter.text_body}`);
  return token;
}
