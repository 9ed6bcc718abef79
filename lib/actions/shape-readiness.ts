import type { ReadinessRow, StoredHold } from '@/db/queries/readiness';
import type { CalendarDay } from '@/lib/domain/calendar-day';
import { localDay } from '@/lib/domain/calendar-day';
import { describeHold, describeLift, findNearestRule, type Hold } from '@/lib/domain/readiness';
import type { HoldShown, ReadyUnit } from '@/lib/schemas/availability';
import { toHours } from '@/lib/schemas/schedule-shape';
import { toDuePoint } from '@/lib/domain/duty-standing';

/** When and for how long somebody means to go out; `onDay` null is today at the unit's dock. */
export type Asked = { at: Date; onDay: CalendarDay | null; plannedTenths: number | null };

/** What is left before the unit's next hold, in the API's units. */
export function toStanding(row: ReadinessRow): ReadyUnit {
  const names = new Map([
    [row.hours_rule_id, row.hours_rule_name],
    [row.outings_rule_id, row.outings_rule_name],
    [row.days_rule_id, row.days_rule_name],
  ]);
  const holdingRuleId = findNearestRule({
    tenths: row.tenths_to_hold,
    hoursRuleId: row.hours_rule_id,
    outings: row.outings_to_hold,
    outingsRuleId: row.outings_rule_id,
    days: row.days_to_hold,
    daysRuleId: row.days_rule_id,
  });
  return {
    unitId: row.id,
    fleetNumber: row.fleet_number,
    modelName: row.model_name,
    carbCount: row.carb_count,
    dockId: row.dock_id,
    engineHours: toHours(row.engine_hours_tenths),
    hoursToHold: row.tenths_to_hold === null ? null : toHours(row.tenths_to_hold),
    outingsToHold: row.outings_to_hold,
    daysToHold: row.days_to_hold,
    holdingRuleId,
    holdingRuleName: names.get(holdingRuleId) ?? null,
  };
}

/**
 * Every reason why the unit may not go on the outing asked about, each with what lifts it. An outing that would
 * run past a hold is one: fewer hours left than planned, when nothing overdue by hours says it already.
 */
export function toHolds(row: ReadinessRow, asked: Asked): HoldShown[] {
  const holds = (row.holds ?? []).map((hold) => toHold(row, hold, asked));
  const { tenths_to_hold: left, hours_rule_id: ruleId, hours_rule_name: ruleName } = row;
  if (left !== null && left > 0 && asked.plannedTenths !== null && left < asked.plannedTenths)
    holds.push({
      reason: 'too_little_left',
      ruleId: ruleId!,
      since: row.read_at.toISOString(),
      text: say({
        reason: 'too_little_left',
        ruleName: ruleName!,
        leftTenths: left,
        plannedTenths: asked.plannedTenths,
      }),
    });
  return holds;
}

function toHold(row: ReadinessRow, hold: StoredHold, asked: Asked): HoldShown {
  return {
    reason: hold.reason,
    ...(hold.rule_id && { ruleId: hold.rule_id }),
    ...(hold.task_id && { taskId: hold.task_id }),
    ...(hold.defect_id && { defectId: hold.defect_id }),
    ...(hold.lay_up_id && { layUpId: hold.lay_up_id }),
    since: new Date(hold.since).toISOString(),
    text: say(toDomain(row, hold, asked)),
  };
}

function toDomain(row: ReadinessRow, hold: StoredHold, asked: Asked): Hold {
  switch (hold.reason) {
    case 'overdue':
      return {
        reason: 'overdue',
        ruleName: hold.rule_name!,
        point: toDuePoint(hold.point!),
        standing: {
          engineHoursTenths: row.engine_hours_tenths,
          outings: row.outing_count,
          today: asked.onDay ?? localDay(asked.at, row.time_zone),
        },
      };
    case 'defect':
      return { reason: 'defect', title: hold.defect_title! };
    case 'laid_up':
      return { reason: 'laid_up', note: hold.lay_up_reason };
    case 'not_assessed':
      return { reason: 'not_assessed' };
  }
}

function say(hold: Hold): string {
  return `${describeHold(hold)} ${describeLift(hold)}`;
}
