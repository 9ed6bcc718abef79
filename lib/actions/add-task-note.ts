import { insertTaskNote, listTaskNotes } from '@/db/queries/tasks';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import type { TaskNote, WriteNote } from '@/lib/schemas/task';
import { accessTask } from './access';
import { toTaskNote } from './shape-task';

/** Writes a note on a task, open or ended; notes are never edited. Throws `not_found`, `forbidden`. */
export async function addTaskNote(ctx: Context, taskId: string, { text }: WriteNote): Promise<TaskNote> {
  await accessTask(ctx, taskId, 'task.write');
  const { id } = await insertTaskNote(ctx.db, {
    task_id: taskId,
    text,
    written_at: ctx.now,
    written_by: personIdOf(ctx.actor),
  });
  const rows = await listTaskNotes(ctx.db, taskId);
  return toTaskNote(rows.find((row) => row.id === id)!);
}
