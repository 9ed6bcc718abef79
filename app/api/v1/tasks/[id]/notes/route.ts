import { addTaskNote } from '@/lib/actions/add-task-note';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';
import { writeNote } from '@/lib/schemas/task';

export const POST = handle({ params: idParams, body: writeNote, status: 201 }, (ctx, { params, body }) =>
  addTaskNote(ctx, params.id, body),
);
