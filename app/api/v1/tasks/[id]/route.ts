import { changeTask } from '@/lib/actions/change-task';
import { getTask } from '@/lib/actions/get-task';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { changeTask as changeTaskInput } from '@/lib/schemas/task';

export const GET = handle({ params: idParams }, (ctx, { params }) => getTask(ctx, params.id));

export const PATCH = handle({ params: idParams, body: changeTaskInput }, (ctx, { params, body }) =>
  changeTask(ctx, params.id, body),
);
