import type { ApiKeyRow } from '@/db/queries/api-keys';
import type { ApiKey } from '@/lib/schemas/api-key';

/** An API key as it is listed: its beginning, never the whole of it. */
export function toApiKey(row: ApiKeyRow): ApiKey {
  return {
    id: row.id,
    name: row.name,
    prefix: row.prefix,
    createdAt: row.created_at.toISOString(),
    lastUsedAt: row.last_used_at?.toISOString() ?? null,
  };
}
