import { ruleApplies, type Scope } from '@/lib/domain/rule';
import type { RuleFormData } from '@/lib/schemas/rule-form';
import type { RuleDraft } from './rule-draft';

/** The units of the fleet that the scope on the form fits. */
export function coveredUnits(draft: RuleDraft, { fleet, models }: RuleFormData): RuleFormData['fleet'] {
  const byId = new Map(models.map((model) => [model.id, model]));
  const whole = (text: string) => (/^\d+$/.test(text.trim()) ? Number(text) : undefined);
  const scope: Scope = {
    ...(draft.modelIds.length > 0 && { modelIds: draft.modelIds }),
    ...(draft.dockIds.length > 0 && { dockIds: draft.dockIds }),
    ...(draft.propulsion && { propulsion: draft.propulsion as Scope['propulsion'] }),
    ...(draft.stroke && { stroke: draft.stroke as Scope['stroke'] }),
    carbCount: { min: whole(draft.carbMin), max: whole(draft.carbMax) },
  };
  return fleet.filter((unit) => {
    const model = byId.get(unit.modelId);
    return model && ruleApplies(scope, { ...unit, propulsion: model.propulsion, stroke: model.stroke });
  });
}
