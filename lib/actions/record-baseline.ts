import { findBaseline, getOutingsBy, insertBaseline } from '@/db/queries/baselines';
import { lockUnits, type UnitRow } from '@/db/queries/units';
import { runTransaction } from '@/db/transaction';
import type { Context } from '@/lib/context';
import { personIdOf } from '@/lib/domain/access';
import { localDay } from '@/lib/domain/calendar-day';
import { ruleApplies } from '@/lib/domain/rule';
import { refuseField } from '@/lib/errors';
import type { Baseline, RecordBaseline } from '@/lib/schemas/baseline';
import { toHours, toTenths } from '@/lib/schemas/schedule-shape';
import { accessRule, accessUnit } from './access';
import { assessAgain } from './assess-again';
import { toBaseline } from './shape-baseline';
import { toScopedUnit } from './shape-unit';

/**
 * Records that a rule's work was last done on a unit before its closures were kept here, and has the unit
 * assessed again. Outings left out are those the records show by that day. Managers and mechanics of the dock.
 * Throws `not_found` on `ruleId`; `invalid_input` on `ruleId` when the rule has ended or is not for the unit, on
 * `closedOn` when that day is still to come at its dock, on `engineHours` or `outings` when the unit has fewer.
 */
export async function recordBaseline(ctx: Context, unitId: string, input: RecordBaseline): Promise<Baseline> {
  return runTransaction(ctx.db, async (trx) => {
    const inside = { ...ctx, db: trx };
    const meter = (await lockUnits(trx, [unitId])).get(unitId);
    const unit = await accessUnit(inside, unitId, 'baseline.write');
    await checkRule(inside, unit, input.ruleId);
    if (input.closedOn > localDay(ctx.now, unit.time_zone)) throw refuseField('closedOn', 'is still to come');
    const engineHoursTenths = toTenths(input.engineHours);
    if (!meter || engineHoursTenths > meter.engine_hours_tenths)
      throw refuseField('engineHours', `is more than the unit's ${toHours(unit.engine_hours_tenths)} h`);
    const outings = input.outings ?? (await getOutingsBy(trx, unitId, input.closedOn));
    if (outings > meter.outing_count)
      throw refuseField('outings', `is more than the unit's ${meter.outing_count} outings`);
    const { id } = await insertBaseline(trx, {
      unit_id: unit.id,
      rule_id: input.ruleId,
      closed_on: input.closedOn,
      engine_hours_tenths: engineHoursTenths,
      outings,
      note: input.note,
      recorded_at: ctx.now,
      recorded_by: personIdOf(ctx.actor),
    });
    await assessAgain(trx, [unit.id]);
    return toBaseline((await findBaseline(trx, id))!);
  });
}

async function checkRule(ctx: Context, unit: UnitRow, ruleId: string): Promise<void> {
  const rule = await accessRule(ctx, ruleId, 'rule.read', 'ruleId');
  if (rule.ended_at) throw refuseField('ruleId', 'is a rule that has ended');
  if (!ruleApplies(rule.scope, toScopedUnit(unit)))
    throw refuseField('ruleId', 'is a rule that is not for this unit');
}
