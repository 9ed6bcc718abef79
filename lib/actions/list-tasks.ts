import { listAllTasks, listEndedTasks, listOpenTasks, type TaskFilter } from '@/db/queries/tasks';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { compareUrgency, type UrgentTask } from '@/lib/domain/urgency';
import { instantPlace, writeCursor } from '@/lib/schemas/cursor';
import { urgentPlace, type Task, type TasksQuery } from '@/lib/schemas/task';
import { docksAsked } from './docks-asked';
import { pageAfter } from './page-after';
import { toTask } from './shape-task';

type Page = { items: Task[]; nextCursor: string | null };
const PAGE = 100;

/**
 * Tasks at the docks the actor works at, in pages: open ones by urgency, closed ones with the last closed first,
 * all with the last opened first. Throws `not_found` or `forbidden` on `dockId`, `invalid_input` on `cursor`.
 */
export async function listTasks(ctx: Context, query: TasksQuery): Promise<Page> {
  const by = personIdOf(ctx.actor);
  const filter: TaskFilter = {
    dockIds: await docksAsked(ctx, query.dockId, 'task.read'),
    unitId: query.unitId,
    kind: query.kind,
    ...(query.mine === 'true' && by && { startedBy: by }),
  };
  const limit = query.limit ?? PAGE;
  return query.state === 'open'
    ? pageByUrgency(ctx, filter, query.cursor, limit)
    : pageByInstant(ctx, filter, { state: query.state, cursor: query.cursor, limit });
}

/** Urgency follows from live meters and today, so the whole list is ordered at each call and cut after the cursor. */
async function pageByUrgency(
  ctx: Context,
  filter: TaskFilter,
  cursor: string | undefined,
  limit: number,
): Promise<Page> {
  const after = pageAfter(urgentPlace, cursor);
  const rows = await listOpenTasks(ctx.db, filter);
  const tasks = rows.map((row) => toTask(row, ctx.now)).sort((a, b) => compareUrgency(keyOf(a), keyOf(b)));
  const rest = after ? tasks.filter((task) => compareUrgency(keyOf(task), after) > 0) : tasks;
  const items = rest.slice(0, limit);
  const last = items.at(-1);
  return { items, nextCursor: last && rest.length > limit ? writeCursor(keyOf(last)) : null };
}

async function pageByInstant(
  ctx: Context,
  filter: TaskFilter,
  { state, cursor, limit }: { state: 'closed' | 'all'; cursor: string | undefined; limit: number },
): Promise<Page> {
  const key = pageAfter(instantPlace, cursor);
  const after = key && { at: new Date(key.at), id: key.id };
  const list = state === 'closed' ? listEndedTasks : listAllTasks;
  const rows = await list(ctx.db, filter, after, limit + 1);
  const items = rows.slice(0, limit).map((row) => toTask(row, ctx.now));
  const last = items.at(-1);
  const at = last && (state === 'closed' ? last.endedAt : last.openedAt);
  return { items, nextCursor: last && rows.length > limit ? writeCursor({ at, id: last.id }) : null };
}

function keyOf(task: Task): UrgentTask {
  const { id, plannedOn, openedAt, fleetNumber } = task;
  return { id, plannedOn, openedAt, fleetNumber, urgency: task.urgency ?? 'later' };
}
