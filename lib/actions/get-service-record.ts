import { findTaskProcedure } from '@/db/queries/procedures';
import { findOperator } from '@/db/queries/operator';
import { findRule } from '@/db/queries/rules';
import { getTaskStanding } from '@/db/queries/tasks';
import { getUnit } from '@/db/queries/units';
import type { Context } from '@/lib/context';
import { composeServiceRecord, type ServiceRecord } from '@/lib/domain/service-record';
import { accessClosure } from './access';

/** A closure as a paper to be kept, and a name for its file. Throws `not_found`, `forbidden`. */
export async function getServiceRecord(
  ctx: Context,
  closureId: string,
): Promise<{ record: ServiceRecord; fileName: string }> {
  const closure = await accessClosure(ctx, closureId, 'task.read');
  const [unit, task, rule, procedure, operator] = await Promise.all([
    getUnit(ctx.db, closure.unit_id),
    getTaskStanding(ctx.db, closure.task_id),
    closure.rule_id ? findRule(ctx.db, closure.rule_id) : undefined,
    findTaskProcedure(ctx.db, closure.task_id),
    findOperator(ctx.db),
  ]);
  const record = composeServiceRecord({
    operatorName: operator?.name ?? '',
    dockName: unit.dock_name,
    timeZone: unit.time_zone,
    fleetNumber: unit.fleet_number,
    modelName: unit.model_name,
    hin: unit.hin,
    registration: unit.registration,
    taskTitle: task.title,
    ruleName: rule?.name ?? null,
    procedure: procedure ?? null,
    closedAt: closure.closed_at,
    closedBy: closure.closer_name,
    engineHoursTenths: closure.engine_hours_tenths,
    outings: closure.outings,
    minutes: closure.minutes,
    note: closure.note,
    results: closure.results,
    signOffs: closure.sign_offs,
    parts: closure.parts_used.map(
      ({ quantity, name, number, dockName, reason }) =>
        `${quantity} × ${name} (${number}), from ${dockName}${reason ? `: ${reason}` : ''}`,
    ),
    reversed: closure.reversed_at && {
      at: closure.reversed_at,
      by: closure.reverser_name,
      reason: closure.reverse_reason ?? '',
    },
  });
  return { record, fileName: `service-record-${slug(unit.fleet_number)}-${closure.closed_on}.pdf` };
}

/** Letters, digits and hyphens: what every file system takes. */
const slug = (text: string) => text.replaceAll(/[^a-z0-9]+/giu, '-').toLowerCase();
