import { listLayUps } from '@/lib/actions/list-lay-ups';
import { recordLayUp } from '@/lib/actions/record-lay-up';
import { handle } from '@/lib/http/handle';
import { createLayUp, layUpsQuery } from '@/lib/schemas/lay-up';

export const GET = handle({ query: layUpsQuery }, (ctx, { query }) => listLayUps(ctx, query));

export const POST = handle({ body: createLayUp, status: 201 }, (ctx, { body }) => recordLayUp(ctx, body));
