import { listTasks } from '@/lib/actions/list-tasks';
import { openTask } from '@/lib/actions/open-task';
import { handle } from '@/lib/http/handle';
import { openTask as openTaskInput, tasksQuery } from '@/lib/schemas/task';

export const GET = handle({ query: tasksQuery }, (ctx, { query }) => listTasks(ctx, query));

export const POST = handle({ body: openTaskInput, status: 201 }, (ctx, { body }) => openTask(ctx, body));
