import { findHeldSince, listClosures } from '@/db/queries/closures';
import { toHours } from '@/lib/schemas/schedule-shape';
import { findTaskProcedure } from '@/db/queries/procedures';
import { findRule } from '@/db/queries/rules';
import { getTaskStanding, listTaskNotes } from '@/db/queries/tasks';
import type { Context } from '@/lib/context';
import { describeRule } from '@/lib/domain/rule-words';
import type { TaskPage } from '@/lib/schemas/task';
import { accessTask } from './access';
import { toClosure } from './shape-closure';
import { toTask, toTaskNote } from './shape-task';

/** A task with its unit's meter, its notes and what was done under its rule. Throws `not_found`, `forbidden`. */
export async function getTask(ctx: Context, id: string): Promise<TaskPage> {
  await accessTask(ctx, id, 'task.read');
  const row = await getTaskStanding(ctx.db, id);
  const task = toTask(row, ctx.now);
  const [notes, closures, heldSince, rule, procedure] = await Promise.all([
    listTaskNotes(ctx.db, id),
    listClosures(ctx.db, row),
    task.holdsUnit ? findHeldSince(ctx.db, row, ctx.now) : null,
    row.rule_id ? findRule(ctx.db, row.rule_id) : undefined,
    findTaskProcedure(ctx.db, id),
  ]);
  return {
    ...task,
    modelName: row.model_name,
    engineHours: toHours(row.meter_tenths),
    outings: row.meter_outings,
    readAt: row.meter_read_at.toISOString(),
    ruleWords: rule ? describeRule({ ...rule, window: rule.tolerance }, { holdsUnit: rule.holds_unit }) : [],
    heldSince: heldSince?.toISOString() ?? null,
    procedure: procedure ?? null,
    notes: notes.map(toTaskNote),
    closures: closures.map(toClosure),
  };
}
