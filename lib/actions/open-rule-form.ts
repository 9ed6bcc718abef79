import { listDocks } from '@/db/queries/docks';
import { listModels } from '@/db/queries/models';
import { listParts } from '@/db/queries/parts';
import { listProcedures } from '@/db/queries/procedures';
import { listUnits } from '@/db/queries/units';
import type { Context } from '@/lib/context';
import { canFleetWide, visibleDocks } from '@/lib/domain/access';
import { localDay } from '@/lib/domain/calendar-day';
import type { RuleFormData } from '@/lib/schemas/rule-form';
import { toHours } from '@/lib/schemas/schedule-shape';
import { requireFleetWide } from './access';
import { getRule } from './get-rule';

/**
 * What the form of a rule is drawn from, for a new one when `ruleId` is null; `mayWrite` says whether the actor
 * may save it. Throws `not_found` on `id`.
 */
export async function openRuleForm(ctx: Context, ruleId: string | null): Promise<RuleFormData> {
  requireFleetWide(ctx, ruleId ? 'rule.read' : 'rule.write');
  const docks = visibleDocks(ctx.actor);
  const [rule, models, dockRows, units, procedures, parts] = await Promise.all([
    ruleId ? getRule(ctx, ruleId) : null,
    listModels(ctx.db),
    listDocks(ctx.db, docks),
    listUnits(ctx.db, docks),
    listProcedures(ctx.db),
    listParts(ctx.db, { retired: true }),
  ]);
  return {
    rule,
    mayWrite: canFleetWide(ctx.actor, 'rule.write'),
    models: models.map(({ id, name, propulsion, stroke }) => ({ id, name, propulsion, stroke })),
    docks: dockRows.map(({ id, name, time_zone }) => ({ id, name, today: localDay(ctx.now, time_zone) })),
    procedures: procedures.map(({ id, name }) => ({ id, name })),
    parts: parts
      .filter(({ id, retired_at }) => !retired_at || rule?.parts.some(({ partId }) => partId === id))
      .map(({ id, number, name }) => ({ id, number, name }))
      .sort((a, b) => a.name.localeCompare(b.name, 'en')),
    fleet: units.map((unit) => ({
      id: unit.id,
      fleetNumber: unit.fleet_number,
      modelId: unit.model_id,
      dockId: unit.dock_id,
      carbCount: unit.carb_count,
      enteredServiceOn: unit.entered_service_on,
      engineHours: toHours(unit.engine_hours_tenths),
      outings: unit.outing_count,
    })),
  };
}
