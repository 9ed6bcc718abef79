import { insertDefect } from '@/db/queries/defects';
import { findCurrentVersionId } from '@/db/queries/procedures';
import { findRule } from '@/db/queries/rules';
import { insertTask } from '@/db/queries/tasks';
import { lockUnits, type UnitRow } from '@/db/queries/units';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { computeMinutes, ruleApplies } from '@/lib/domain/rule';
import { refuseField } from '@/lib/errors';
import type { OpenTask, TaskPage } from '@/lib/schemas/task';
import { accessUnit } from './access';
import { checkPlannedOn } from './check-planned-on';
import { getTask } from './get-task';
import { refusingTaken } from './refusing-taken';
import { toScopedUnit } from './shape-unit';

/**
 * Opens a task that a person asks for; or, with `ruleId`, the task of a rule before its lead, so that it can be
 * planned. A repair that holds the unit makes a holding defect with it, in the same transaction.
 * Throws `not_found` on `unitId` or `ruleId`, `conflict` on `unitId` for a retired unit and on `ruleId` when that
 * rule has an open task on the unit, `invalid_input` on `procedureId` for one that is not in use and on `ruleId` for a rule that does not apply to the unit.
 */
export async function openTask(ctx: Context, input: OpenTask): Promise<TaskPage> {
  const unit = await accessUnit(ctx, input.unitId, 'task.write', 'unitId');
  if (unit.retired_at) throw refuseField('unitId', 'is retired', 'conflict');
  if (input.plannedOn) checkPlannedOn(ctx, unit.time_zone, input.plannedOn);
  const id =
    input.ruleId === undefined
      ? await openAdHoc(ctx, unit, input)
      : await openOfRule(ctx, unit, input.ruleId, input);
  return getTask(ctx, id);
}

async function openAdHoc(ctx: Context, unit: UnitRow, input: OpenTask): Promise<string> {
  const title = input.title ?? '';
  const versionId = await findVersion(ctx, input.procedureId ?? null);
  return runTransaction(ctx.db, async (trx) => {
    let defectId: string | null = null;
    if (input.holdsUnit) {
      await lockUnits(trx, [unit.id]);
      const defect = await insertDefect(trx, {
        unit_id: unit.id,
        title,
        detail: input.detail ?? null,
        holds_unit: true,
        reported_at: ctx.now,
        reported_by: personIdOf(ctx.actor),
      });
      defectId = defect.id;
    }
    const { id } = await insertTask(trx, {
      ...commonColumns(ctx, unit, input),
      kind: input.kind ?? 'repair',
      title,
      origin: 'person',
      defect_id: defectId,
      procedure_version_id: versionId,
    });
    return id;
  });
}

async function openOfRule(ctx: Context, unit: UnitRow, ruleId: string, input: OpenTask): Promise<string> {
  const rule = await findRule(ctx.db, ruleId);
  if (!rule) throw refuseField('ruleId', 'is no rule of this fleet', 'not_found');
  if (rule.ended_at || !ruleApplies(rule.scope, toScopedUnit(unit)))
    throw refuseField('ruleId', 'is a rule that does not apply to this unit');
  const versionId = rule.procedure_id
    ? ((await findCurrentVersionId(ctx.db, rule.procedure_id)) ?? null)
    : null;
  const taken = 'has an open task on this unit already';
  const { id } = await refusingTaken({ task_open_rule: ['ruleId', taken] }, () =>
    insertTask(ctx.db, {
      ...commonColumns(ctx, unit, input),
      kind: rule.kind,
      title: rule.name,
      origin: 'rule',
      rule_id: rule.id,
      procedure_version_id: versionId,
      expected_minutes: computeMinutes(rule.labour, { carbCount: unit.carb_count, engines: unit.engines }),
    }),
  );
  return id;
}

/** The version of a procedure that a task keeps. Throws `invalid_input` on `procedureId` for one not in use. */
async function findVersion(ctx: Context, procedureId: string | null): Promise<string | null> {
  if (procedureId === null) return null;
  const versionId = await findCurrentVersionId(ctx.db, procedureId);
  if (!versionId) throw refuseField('procedureId', 'is no procedure in use');
  return versionId;
}

function commonColumns(ctx: Context, unit: UnitRow, input: OpenTask) {
  const by = personIdOf(ctx.actor);
  return {
    unit_id: unit.id,
    detail: input.detail ?? null,
    opened_at: ctx.now,
    opened_by: by,
    ...(input.plannedOn && { planned_on: input.plannedOn, planned_at: ctx.now, planned_by: by }),
  };
}
