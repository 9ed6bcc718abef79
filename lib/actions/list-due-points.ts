import { isAssessed, listDuePoints as listDuePointRows, listLastClosings } from '@/db/queries/due-points';
import { listRules, type RuleRow } from '@/db/queries/rules';
import type { Context } from '@/lib/context';
import { localDay } from '@/lib/domain/calendar-day';
import { DUE_STATES, type DuePoint, type Standing } from '@/lib/domain/due';
import { ruleApplies } from '@/lib/domain/rule';
import type { UnitDuePoints } from '@/lib/schemas/due-point';
import { toHours } from '@/lib/schemas/schedule-shape';
import { accessUnit } from './access';
import { toDuty } from './shape-duty';
import { toScopedUnit } from './shape-unit';

/**
 * How a unit stands today under every rule that is for it, worst first: each trigger's stored due point, its
 * state and what is left. While `assessed` is false the worker has still to compute them. Throws `not_found`.
 */
export async function listDuePoints(ctx: Context, unitId: string): Promise<UnitDuePoints> {
  const unit = await accessUnit(ctx, unitId, 'unit.read');
  const [rules, points, closings, assessed] = await Promise.all([
    listRules(ctx.db),
    listDuePointRows(ctx.db, unit.id),
    listLastClosings(ctx.db, unit.id),
    isAssessed(ctx.db, unit.id),
  ]);
  const standing: Standing = {
    engineHoursTenths: unit.engine_hours_tenths,
    outings: unit.outing_count,
    today: localDay(ctx.now, unit.time_zone),
  };
  const pointsOf = (rule: RuleRow): (DuePoint | null)[] =>
    rule.triggers.map(
      (_, index) => points.find((p) => p.ruleId === rule.id && p.triggerIndex === index)?.point ?? null,
    );
  const items = rules
    .filter((rule) => ruleApplies(rule.scope, toScopedUnit(unit)))
    .map((rule) =>
      toDuty(rule, pointsOf(rule), standing, closings.find((closing) => closing.rule_id === rule.id) ?? null),
    )
    .sort((a, b) => DUE_STATES.indexOf(b.state) - DUE_STATES.indexOf(a.state));
  return {
    unitId: unit.id,
    engineHours: toHours(standing.engineHoursTenths),
    outings: standing.outings,
    today: standing.today,
    assessed,
    items,
  };
}
