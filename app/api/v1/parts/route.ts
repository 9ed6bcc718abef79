import { createPart } from '@/lib/actions/create-part';
import { listParts } from '@/lib/actions/list-parts';
import { handle } from '@/lib/http/handle';
import { createPart as createPartInput, partsQuery } from '@/lib/schemas/part';

export const GET = handle({ query: partsQuery }, (ctx, { query }) => listParts(ctx, query));

export const POST = handle({ body: createPartInput, status: 201 }, (ctx, { body }) => createPart(ctx, body));
