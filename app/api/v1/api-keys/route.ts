import { createApiKey } from '@/lib/actions/create-api-key';
import { listApiKeys } from '@/lib/actions/list-api-keys';
import { handle } from '@/lib/http/handle';
import { createApiKey as createApiKeyInput } from '@/lib/schemas/api-key';

export const GET = handle({}, async (ctx) => ({ items: await listApiKeys(ctx), nextCursor: null }));

export const POST = handle({ body: createApiKeyInput, status: 201 }, (ctx, { body }) =>
  createApiKey(ctx, body),
);
