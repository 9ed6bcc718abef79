import type { Selectable, Updateable } from 'kysely';
import { getTaskStanding, lockTask, updateTask, type TaskRow } from '@/db/queries/tasks';
import type { TaskTable } from '@/db/tables';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { Refusal, refuseField } from '@/lib/errors';
import type { ChangeTask, TaskPage } from '@/lib/schemas/task';
import { accessTask } from './access';
import { checkPlannedOn } from './check-planned-on';
import { refuseEnded } from './refuse-ended';
import { reserveNeeds } from './reserve-needs';
import { getTask } from './get-task';

/**
 * Starts a task, which sets aside what it needs and is here, or takes that back, plans it on a day or on none, changes its words. Only what is named changes;
 * what is so already stays as it was. Throws `conflict` for a task that has ended, on `revision` when somebody
 * changed it since, on `started` when somebody else is at it; `invalid_input` on `plannedOn` for a day gone by and
 * on `title` for a rule's task.
 */
export async function changeTask(ctx: Context, id: string, input: ChangeTask): Promise<TaskPage> {
  const seen = await accessTask(ctx, id, 'task.write');
  await runTransaction(ctx.db, async (trx) => {
    const task = await lockTask(trx, id);
    if (task.ended_at) throw refuseEnded(await getTaskStanding(trx, id));
    if (input.revision !== undefined && input.revision !== task.revision)
      throw refuseField('revision', 'Somebody changed this task since you read it. Look again.', 'conflict');
    const set = {
      ...computeStart(ctx, task, input),
      ...computePlan(ctx, task, seen, input),
      ...computeWords(task, input),
    };
    if (Object.keys(set).length > 0) await updateTask(trx, id, set);
    else if (input.started === true && task.started_by !== personIdOf(ctx.actor)) {
      const { starter_name } = await getTaskStanding(trx, id);
      throw refuseField('started', `${starter_name ?? 'Somebody'} has started this already`, 'conflict');
    }
    if (set.started_at) await reserveNeeds(ctx, trx, id);
  });
  return getTask(ctx, id);
}

type Task = Selectable<TaskTable>;
type Change = Updateable<TaskTable>;

function computeStart(ctx: Context, task: Task, { started }: ChangeTask): Change {
  if (started === undefined || started === (task.started_at !== null)) return {};
  return started
    ? { started_at: ctx.now, started_by: personIdOf(ctx.actor) }
    : { started_at: null, started_by: null };
}

function computePlan(ctx: Context, task: Task, seen: TaskRow, { plannedOn }: ChangeTask): Change {
  if (plannedOn === undefined || plannedOn === task.planned_on) return {};
  if (plannedOn === null) return { planned_on: null, planned_at: null, planned_by: null };
  checkPlannedOn(ctx, seen.time_zone, plannedOn);
  return { planned_on: plannedOn, planned_at: ctx.now, planned_by: personIdOf(ctx.actor) };
}

function computeWords(task: Task, { title, detail }: ChangeTask): Change {
  if (title !== undefined && title !== task.title && task.origin === 'rule')
    throw new Refusal('invalid_input', "A rule's task bears the rule's name.", [
      { path: 'title', message: "is the rule's name: change the rule" },
    ]);
  return {
    ...(title !== undefined && title !== task.title && { title }),
    ...(detail !== undefined && (detail || null) !== task.detail && { detail: detail || null }),
  };
}
