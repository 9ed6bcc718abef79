import { withdrawTask } from '@/lib/actions/withdraw-task';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { withdrawTask as withdrawTaskInput } from '@/lib/schemas/task';

export const POST = handle({ params: idParams, body: withdrawTaskInput }, (ctx, { params, body }) =>
  withdrawTask(ctx, params.id, body),
);
