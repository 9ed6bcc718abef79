import type { Insertable } from 'kysely';
import type { NamedRuleRow } from '@/db/queries/rules';
import type { RuleTable } from '@/db/tables';
import type { CreateRule, Rule } from '@/lib/schemas/rule';
import { fromSchedule, toSchedule } from '@/lib/schemas/schedule-shape';

/** A rule as the API and the screens show it: hours in decimals. */
export function toRule(row: NamedRuleRow, unitCount: number): Rule {
  return {
    id: row.id,
    name: row.name,
    kind: row.kind,
    appliesTo: row.scope,
    ...fromSchedule({ triggers: row.triggers, lead: row.lead, window: row.tolerance }),
    holdsUnit: row.holds_unit,
    labour: row.labour,
    parts: row.parts,
    procedureId: row.procedure_id,
    wantsSecondPerson: row.wants_second_person,
    wantsTestRide: row.wants_test_ride,
    revision: row.revision,
    unitCount,
    createdAt: row.created_at.toISOString(),
    changedAt: row.changed_at.toISOString(),
    changedBy: row.changed_by_name,
    endedAt: row.ended_at?.toISOString() ?? null,
    endedBy: row.ended_by_name,
    endReason: row.end_reason,
  };
}

/** The columns that a rule as sent is stored in. */
export function fromRule(input: CreateRule) {
  const { triggers, lead, window } = toSchedule(input);
  return {
    name: input.name,
    kind: input.kind,
    scope: JSON.stringify(input.appliesTo),
    triggers: JSON.stringify(triggers),
    lead: JSON.stringify(lead),
    tolerance: JSON.stringify(window),
    holds_unit: input.holdsUnit,
    labour: JSON.stringify(input.labour),
    parts: JSON.stringify(input.parts),
    procedure_id: input.procedureId ?? null,
    wants_second_person: input.wantsSecondPerson,
    wants_test_ride: input.wantsTestRide,
  } satisfies Omit<Insertable<RuleTable>, 'created_by'>;
}
