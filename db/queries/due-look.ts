import { sql, type Kysely } from 'kysely';
import type { DB } from '../tables';
import type { RuleRow } from './rules';

/** What of a rule in force its due points follow from. */
export type DutyRule = Pick<RuleRow, 'id' | 'scope' | 'triggers' | 'lead' | 'tolerance'>;

/** What a unit's due points follow from, and what is stored of them: text where there is much of it. */
export type LookedUnit = {
  id: string;
  modelId: string;
  dockId: string;
  enteredServiceOn: string;
  propulsion: 'jet' | 'outboard' | 'inboard' | 'electric';
  stroke: 'two' | 'four' | null;
  carbCount: number;
  retired: boolean;
  /** Whether a write has asked for the unit to be assessed anew. */
  behind: boolean;
  /** What counts as done, in order: rule, day, engine hours in tenths and outings, set apart by spaces and commas. */
  closings: string | null;
  /** The stored due points, as `duePointText` writes each, by rule and trigger. */
  points: string | null;
};

/**
 * These units and the rules in force (by id) in one statement and so in one snapshot, without a lock: cheap enough
 * to ask whether anything has to be written at all.
 */
export async function lookAtDuePoints(
  db: Kysely<DB>,
  unitIds: readonly string[],
): Promise<{ units: LookedUnit[]; rules: DutyRule[] }> {
  const { rows } = await sql<{ units: LookedUnit[]; rules: DutyRule[] }>`
    with asked as (select unnest((select ${[...unitIds]}::uuid[])) as id),
    looked as (
      select u.id, u.model_id as "modelId", u.dock_id as "dockId", u.entered_service_on as "enteredServiceOn",
             m.propulsion, m.stroke, coalesce(u.carb_count_override, m.carb_count) as "carbCount",
             u.retired_at is not null as retired,
             coalesce(a.assessed_revision < a.wanted_revision, true) as behind,
             (select string_agg(concat_ws(' ', c.rule_id, c.closed_on, c.engine_hours_tenths, c.outings), ','
                order by c.closed_at, c.id) from closing c where c.unit_id = u.id) as closings,
             (select string_agg(concat_ws(' ', p.rule_id, p.trigger_index,
                'h', p.due_tenths, p.upcoming_from_tenths, p.overdue_from_tenths,
                'o', p.due_outings, p.upcoming_from_outings, p.overdue_from_outings,
                'd', p.due_on, p.upcoming_from_on, p.overdue_from_on), ',' order by p.rule_id, p.trigger_index)
                from due_point p where p.unit_id = u.id) as points
        from asked
        join unit u on u.id = asked.id
        join model m on m.id = u.model_id
        left join assessment a on a.unit_id = u.id
    )
    select (select coalesce(json_agg(l), '[]') from looked l) as units,
           (select coalesce(json_agg(json_build_object('id', id, 'scope', scope, 'triggers', triggers, 'lead', lead,
              'tolerance', tolerance) order by id), '[]') from rule where ended_at is null) as rules /* prepared */`.execute(
    db,
  );
  return rows[0]!;
}
