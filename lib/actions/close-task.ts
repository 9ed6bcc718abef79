import { findHeldSince, findLastClosing, getClosure, insertClosure } from '@/db/queries/closures';
import { clearDefect } from '@/db/queries/defects';
import { insertClosureReading } from '@/db/queries/meter-at';
import { getTaskStanding, lockTask, updateTask, type TaskRow } from '@/db/queries/tasks';
import { lockUnits } from '@/db/queries/units';
import { runTransaction } from '@/db/transaction';
import type { Transaction } from 'kysely';
import type { DB } from '@/db/tables';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { localDay } from '@/lib/domain/calendar-day';
import { formatTenths } from '@/lib/domain/meter';
import { describeDay } from '@/lib/domain/words';

import { refuseField } from '@/lib/errors';
import type { CloseTask, Closure } from '@/lib/schemas/task';
import { accessTask } from './access';
import { assessAgain, enqueueRefresh } from './assess-again';
import { computeClosingMeter, type ClosingMeter } from './closing-meter';
import { settleInstant } from './keep-reading';
import { refuseEnded } from './refuse-ended';
import { settleBench } from './settle-bench';
import { toClosure } from './shape-closure';
import { checkPartsUsed, takeParts } from './take-parts';

/**
 * Closes a task: the record that the work was done, at what engine hours and outing count, with the results that
 * stand at the bench. Clears the defect the task comes from; the worker then moves the due points. `at` is now unless
 * given; engine hours are what the meter showed then unless given, and when they are above the live meter they are a
 * reading too. `results` are recorded on the way, `partsUsed` taken out of stock, and what was set aside is released.
 * Throws `conflict` when the task has ended, saying by whom and when; `unit_out` while the unit is out; on `at` and
 * `engineHours` what cannot be; `reason_needed` on `note` for an unusual run; what `settleBench`
 * and `checkPartsUsed` throw.
 */
export async function closeTask(ctx: Context, id: string, input: CloseTask): Promise<Closure> {
  const seen = await accessTask(ctx, id, 'closure.write');
  const at = settleInstant(input.at, ctx.now);
  if (at > ctx.now) throw refuseField('at', 'is in the future');
  const closureId = await runTransaction(ctx.db, async (trx) => {
    const live = (await lockUnits(trx, [seen.unit_id])).get(seen.unit_id);
    if (!live) throw refuseField('id', 'is a task of a unit without a meter', 'not_found');
    const task = await lockTask(trx, id);
    if (task.ended_at) throw refuseEnded(await getTaskStanding(trx, id));
    const meter = await computeClosingMeter(ctx, trx, { live, at, timeZone: seen.time_zone, input });
    const closedOn = localDay(at, seen.time_zone);
    if (task.rule_id) await checkAgainstLast(trx, { ...seen, rule_id: task.rule_id }, at, closedOn, meter);
    const heldSince = await findHeldSince(trx, task, at);
    const by = personIdOf(ctx.actor);
    const bench = await settleBench(ctx, trx, id, input.results ?? []);
    if (meter.reading)
      await insertClosureReading(trx, { ...meter.reading, recorded_at: ctx.now, recorded_by: by });
    const taken = await checkPartsUsed(ctx, trx, {
      taskId: id,
      dockId: seen.dock_id,
      used: input.partsUsed ?? [],
    });
    const closure = await insertClosure(trx, {
      task_id: id,
      unit_id: task.unit_id,
      rule_id: task.rule_id,
      closed_at: at,
      closed_on: closedOn,
      engine_hours_tenths: meter.tenths,
      outings: meter.outings,
      minutes: input.minutes ?? null,
      note: input.note || null,
      results: JSON.stringify(bench.results),
      sign_offs: JSON.stringify(bench.signOffs),
      parts_used: JSON.stringify(taken),
      held_since_at: heldSince && heldSince < at ? heldSince : null,
      closed_by: by,
      recorded_at: ctx.now,
    });
    await takeParts(ctx, trx, { taskId: id, closureId: closure.id, taken });
    await updateTask(trx, id, { ended_at: ctx.now });
    if (task.defect_id)
      await clearDefect(trx, task.defect_id, { at, by, note: input.note || `Closed: ${task.title}.` });
    await (task.rule_id ? assessAgain : enqueueRefresh)(trx, [task.unit_id]);
    return closure.id;
  });
  return toClosure(await getClosure(ctx.db, closureId));
}

/** Closings of a rule follow each other in time and on the meter; one that does not is a slip. */
async function checkAgainstLast(
  trx: Transaction<DB>,
  task: TaskRow & { rule_id: string },
  at: Date,
  closedOn: string,
  meter: ClosingMeter,
): Promise<void> {
  const last = await findLastClosing(trx, task.unit_id, task.rule_id);
  if (!last) return;
  const when = `${describeDay(last.closed_on)} at ${formatTenths(last.engine_hours_tenths)} h`;
  if (closedOn < last.closed_on || at < last.closed_at)
    throw refuseField('at', `is before this was last done, on ${when}`);
  if (meter.tenths < last.engine_hours_tenths)
    throw refuseField('engineHours', `is less than when this was last done, on ${when}`, 'reading_refused');
}
