import { closeTask } from '@/lib/actions/close-task';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { closeTask as closeTaskInput } from '@/lib/schemas/task';

export const POST = handle({ params: idParams, body: closeTaskInput, status: 201 }, (ctx, { params, body }) =>
  closeTask(ctx, params.id, body),
);
