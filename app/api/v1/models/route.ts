import { createModel } from '@/lib/actions/create-model';
import { listModels } from '@/lib/actions/list-models';
import { handle } from '@/lib/http/handle';
import { createModel as createModelInput } from '@/lib/schemas/model';

export const GET = handle({}, async (ctx) => ({ items: await listModels(ctx), nextCursor: null }));

export const POST = handle({ body: createModelInput, status: 201 }, (ctx, { body }) =>
  createModel(ctx, body),
);
