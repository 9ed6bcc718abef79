import type { Transaction } from 'kysely';
import { lockManagersOfAllDocks } from '@/db/queries/people';
import type { DB } from '@/db/tables';
import { refuseField } from '@/lib/errors';

/**
 * Throws `conflict` on `path` when this person is the last manager of all docks, who alone could undo it. Locks
 * the others until the transaction ends, so that two cannot step down at the same time.
 */
export async function keepAManager(trx: Transaction<DB>, personId: string, path: string): Promise<void> {
  const managers = await lockManagersOfAllDocks(trx);
  if (managers.includes(personId) && managers.length === 1) {
    throw refuseField(
      path,
      'This is the last manager of all docks. Make somebody else one first.',
      'conflict',
    );
  }
}
