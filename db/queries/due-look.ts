import { sql, type Kysely } from 'kysely';
import type { DB } from '../tables';
import type { RuleRow } from './rules';

/** What of a rule in force its due points follow from. */
export type DutyRule = Pick<RuleRow, 'id' | 'scope' | 'triggers' | 'lead' | 'tolerance'>;

/** What a unit's due points follow from: text where there is much of it. */
export type LookedUnit = {
  id: string;
  modelId: string;
  dockId: string;
  enteredServiceOn: string;
  propulsion: 'jet' | 'outboard' | 'inboard' | 'electric';
  stroke: 'two' | 'four' | null;
  carbCount: number;
  retired: boolean;
  /** What counts as done, in order: rule, day, engine hours in tenths and outings, set apart by spaces and commas. */
  closings: string | null;
  /** The fingerprint of all this and of the rules in force: a whole number of 64 bits. */
  factsHash: string;
};

/**
 * What due points follow from, as one number a unit. Rows are hashed whole and their hashes joined by "exclusive or",
 * which no order of rows changes; no two rows of a table are alike, so none cancels another.
 */
const rulesHash = sql`(select coalesce(bit_xor(hash_record_extended(
    row(r.id, r.scope, r.triggers, r.lead, r.tolerance), 0)), 0) as hash from rule r where r.ended_at is null)`;
const factsHash = sql`(hash_record_extended(row(u.model_id, u.dock_id, u.entered_service_on, m.propulsion, m.stroke,
      coalesce(u.carb_count_override, m.carb_count), u.retired_at is not null), 0)
    # coalesce((select bit_xor(hash_record_extended(c, 0)) from closing c where c.unit_id = u.id), 0)
    # rules.hash)`;
/** The stored due points of unit `u`, as one number. */
export const pointsHash = sql`coalesce((select bit_xor(hash_record_extended(p, 0)) from due_point p
    where p.unit_id = u.id), 0)`;

/**
 * Those of the units that have to be computed: a write asked for it, or their facts or stored due points are not
 * those of the last time. In one statement without a lock, of which nothing travels for the others.
 */
export async function listUnproven(db: Kysely<DB>, unitIds: readonly string[]): Promise<string[]> {
  const { rows } = await sql<{ id: string }>`
    select u.id from unit u
      join model m on m.id = u.model_id
      cross join ${rulesHash} as rules
     where u.id = any((select ${[...unitIds]}::uuid[])::uuid[])
       and not coalesce((select a.assessed_revision >= a.wanted_revision and a.facts_hash = ${factsHash}
             and a.points_hash = ${pointsHash} from assessment a where a.unit_id = u.id), false)
     order by u.id /* prepared */`.execute(db);
  return rows.map((row) => row.id);
}

/** These units and the rules in force (by id) in one statement, and so in one snapshot. */
export async function lookAtDuePoints(
  db: Kysely<DB>,
  unitIds: readonly string[],
): Promise<{ units: LookedUnit[]; rules: DutyRule[] }> {
  const { rows } = await sql<{ units: LookedUnit[]; rules: DutyRule[] }>`
    with looked as (
      select u.id, u.model_id as "modelId", u.dock_id as "dockId", u.entered_service_on as "enteredServiceOn",
             m.propulsion, m.stroke, coalesce(u.carb_count_override, m.carb_count) as "carbCount",
             u.retired_at is not null as retired,
             (select string_agg(concat_ws(' ', c.rule_id, c.closed_on, c.engine_hours_tenths, c.outings), ','
                order by c.closed_at, c.id) from closing c where c.unit_id = u.id) as closings,
             ${factsHash}::text as "factsHash"
        from unit u
        join model m on m.id = u.model_id
        cross join ${rulesHash} as rules
       where u.id = any((select ${[...unitIds]}::uuid[])::uuid[])
    )
    select (select coalesce(json_agg(l), '[]') from looked l) as units,
           (select coalesce(json_agg(json_build_object('id', id, 'scope', scope, 'triggers', triggers, 'lead', lead,
              'tolerance', tolerance) order by id), '[]') from rule where ended_at is null) as rules /* prepared */`.execute(
    db,
  );
  return rows[0]!;
}
