import { reverseClosure } from '@/lib/actions/reverse-closure';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { reverseClosure as reverseClosureInput } from '@/lib/schemas/task';

export const POST = handle({ params: idParams, body: reverseClosureInput }, (ctx, { params, body }) =>
  reverseClosure(ctx, params.id, body),
);
