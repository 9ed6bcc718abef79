import { signOffTask } from '@/lib/actions/sign-off-task';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { signOffTask as signOffTaskInput } from '@/lib/schemas/work';

export const POST = handle(
  { params: idParams, body: signOffTaskInput, status: 201 },
  (ctx, { params, body }) => signOffTask(ctx, params.id, body),
);
