import { listPresent, seePerson } from '@/db/queries/bench';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import type { Present } from '@/lib/schemas/work';
import { accessTask } from './access';

/** Somebody counts as being at a task for this long after they were last seen there. */
const PRESENT_MS = 60_000;

/** Notes that the person is at the task now. Answers who is, by name. Throws `not_found`, `forbidden`. */
export async function seeAtTask(ctx: Context, taskId: string): Promise<{ items: Present[] }> {
  await accessTask(ctx, taskId, 'task.write');
  const personId = personIdOf(ctx.actor);
  if (personId) await seePerson(ctx.db, { task_id: taskId, person_id: personId, seen_at: ctx.now });
  return { items: await listAtTask(ctx, taskId) };
}

/** Who is at a task the caller may read, by name. */
export async function listAtTask(ctx: Context, taskId: string): Promise<Present[]> {
  const rows = await listPresent(ctx.db, taskId, new Date(ctx.now.getTime() - PRESENT_MS));
  return rows.map(({ id, name, seen_at }) => ({ id, name, seenAt: seen_at.toISOString() }));
}
