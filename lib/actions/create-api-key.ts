import { insertApiKey } from '@/db/queries/api-keys';
import type { Context } from '@/lib/context';
import type { CreateApiKey, NewApiKey } from '@/lib/schemas/api-key';
import { requireFleetWide } from './access';
import { hashToken, makeToken } from '@/lib/secrets/one-time-token';
import { ownSelf } from './own-self';
import { toApiKey } from './shape-api-key';

/** How much of a key is shown in the list, so that its owner tells it from others. */
const PREFIX_LENGTH = 8;

/**
 * Makes an API key that may do what its owner may. Managers only, signed in, not by another key. The key itself is
 * answered here and never again: only its SHA-256 is kept.
 */
export async function createApiKey(ctx: Context, input: CreateApiKey): Promise<NewApiKey> {
  requireFleetWide(ctx, 'api-key.write');
  const { personId } = ownSelf(ctx, { signedIn: true });
  const key = `ww_${makeToken().token}`;
  const row = await insertApiKey(ctx.db, {
    personId,
    name: input.name,
    prefix: key.slice(0, PREFIX_LENGTH),
    keyHash: hashToken(key),
    now: ctx.now,
  });
  return { ...toApiKey(row), key };
}
