import { createProcedure } from '@/lib/actions/create-procedure';
import { listProcedures } from '@/lib/actions/list-procedures';
import { handle } from '@/lib/http/handle';
import { createProcedure as createProcedureInput } from '@/lib/schemas/procedure';

export const GET = handle({}, async (ctx) => ({ items: await listProcedures(ctx), nextCursor: null }));

export const POST = handle({ body: createProcedureInput, status: 201 }, (ctx, { body }) =>
  createProcedure(ctx, body),
);
