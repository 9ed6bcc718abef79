import { listApiKeys as listApiKeyRows } from '@/db/queries/api-keys';
import type { Context } from '@/lib/context';
import type { ApiKey } from '@/lib/schemas/api-key';
import { ownSelf } from './own-self';
import { toApiKey } from './shape-api-key';

/** One's own API keys that work, newest first. */
export async function listApiKeys(ctx: Context): Promise<ApiKey[]> {
  return (await listApiKeyRows(ctx.db, ownSelf(ctx).personId)).map(toApiKey);
}
