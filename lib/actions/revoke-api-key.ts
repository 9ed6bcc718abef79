import { revokeApiKey as revokeApiKeyRow } from '@/db/queries/api-keys';
import type { Context } from '@/lib/context';
import { refuseField } from '@/lib/errors';
import { ownSelf } from './own-self';

/** Ends one of one's own API keys from its next request on, whatever one's role is by now. Throws `not_found` on `id`. */
export async function revokeApiKey(ctx: Context, { id }: { id: string }): Promise<void> {
  const { personId } = ownSelf(ctx);
  if (!(await revokeApiKeyRow(ctx.db, { id, personId }, ctx.now))) {
    throw refuseField('id', 'is no API key of yours', 'not_found');
  }
}
