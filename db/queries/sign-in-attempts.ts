import { sql, type Kysely, type Transaction } from 'kysely';
import type { DB } from '../tables';

export type AttemptKeys = { emailKey: string; address: string; deviceId: string | null };
export type Failures = { account: Date[]; address: Date[]; device: Date[] };

/** More wrong attempts than any counter tells apart. */
const ENOUGH = 100;

/**
 * Makes attempts on the same account, address or device wait for each other until the transaction ends, so that
 * a hundred sent at once are counted one by one. Locks in the order of the keys.
 */
export async function lockAttempts(trx: Transaction<DB>, keys: AttemptKeys): Promise<void> {
  const names = keys.deviceId ? [`device:${keys.deviceId}`] : [`a:${keys.emailKey}`, `n:${keys.address}`];
  await sql`select pg_advisory_xact_lock(key)
    from (select hashtextextended(name, 20261201) as key from unnest(${names}::text[]) as name order by 1) as keys`.execute(
    trx,
  );
}

/** When attempts failed since `since`, by counter. Those from a known device are its own affair alone. */
export async function listFailures(db: Kysely<DB>, keys: AttemptKeys, since: Date): Promise<Failures> {
  const failed = db
    .selectFrom('sign_in_attempt')
    .select('attempted_at')
    .where('succeeded', '=', false)
    .where('attempted_at', '>', since)
    .orderBy('attempted_at', 'desc')
    .limit(ENOUGH);
  const times = async (query: typeof failed) => (await query.execute()).map((row) => row.attempted_at);
  if (keys.deviceId) {
    return { account: [], address: [], device: await times(failed.where('device_id', '=', keys.deviceId)) };
  }
  const unknown = failed.where('device_id', 'is', null);
  return {
    account: await times(unknown.where('email_key', '=', keys.emailKey)),
    address: await times(unknown.where('address', '=', keys.address)),
    device: [],
  };
}

/** Records an attempt as failed, before the password is looked at, and answers its id. */
export async function insertAttempt(db: Kysely<DB>, keys: AttemptKeys, now: Date): Promise<number> {
  const { id } = await db
    .insertInto('sign_in_attempt')
    .values({
      email_key: keys.emailKey,
      address: keys.address,
      device_id: keys.deviceId,
      succeeded: false,
      attempted_at: now,
    })
    .returning('id')
    .executeTakeFirstOrThrow();
  return id;
}

/** Takes an attempt back out of what is counted as wrong. */
export async function markAttemptSucceeded(db: Kysely<DB>, id: number): Promise<void> {
  await db.updateTable('sign_in_attempt').set({ succeeded: true }).where('id', '=', id).execute();
}

/** Forgets what matters to no counter any more, of this account and this address. */
export async function deleteOldAttempts(db: Kysely<DB>, keys: AttemptKeys, before: Date): Promise<void> {
  await db
    .deleteFrom('sign_in_attempt')
    .where('attempted_at', '<', before)
    .where((eb) => eb.or([eb('email_key', '=', keys.emailKey), eb('address', '=', keys.address)]))
    .execute();
}
