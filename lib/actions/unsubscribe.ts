import { endDigestByKey } from '@/db/queries/digests';
import type { Context } from '@/lib/context';
import { refuseField } from '@/lib/errors';

/** Ends the digest for whoever holds the key of one; again changes nothing. Throws `not_found` on `key`. */
export async function unsubscribe(ctx: Context, { key }: { key: string }): Promise<void> {
  if (!(await endDigestByKey(ctx.db, key))) throw refuseField('key', 'is no key of ours', 'not_found');
}
