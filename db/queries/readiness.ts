import { sql, type Kysely } from 'kysely';
import type { CalendarDay } from '@/lib/domain/calendar-day';
import type { DuePointColumns } from '@/lib/domain/duty-standing';
import type { HoldReason } from '@/lib/domain/readiness';
import type { DB } from '../tables';

/** One hold of a unit. `since` is an instant as ISO text, `point` the due point of an overdue rule. */
export type StoredHold = {
  reason: Exclude<HoldReason, 'too_little_left'>;
  rule_id: string | null;
  rule_name: string | null;
  task_id: string | null;
  defect_id: string | null;
  defect_title: string | null;
  lay_up_id: string | null;
  lay_up_reason: string | null;
  since: string;
  point: DuePointColumns | null;
};

/** A unit with its holds, what is left before the next one, and its open outing. */
export type ReadinessRow = {
  id: string;
  fleet_number: string;
  dock_id: string;
  time_zone: string;
  model_name: string;
  carb_count: number;
  engine_hours_tenths: number;
  outing_count: number;
  read_at: Date;
  tenths_to_hold: number | null;
  hours_rule_id: string | null;
  hours_rule_name: string | null;
  outings_to_hold: number | null;
  outings_rule_id: string | null;
  outings_rule_name: string | null;
  days_to_hold: number | null;
  days_rule_id: string | null;
  days_rule_name: string | null;
  holds: StoredHold[] | null;
  outing_id: string | null;
  started_at: Date | null;
  due_back_at: Date | null;
};

/** Which units: of some docks, or one. */
export type ReadinessOf = { dockIds: 'all' | readonly string[] } | { unitId: string };

/**
 * How every unit stands at an instant, read from the facts in one statement and so in one snapshot. `onDay` asks
 * about another day than that instant's at each unit's dock. Retired units are left out; order is not promised.
 */
export async function listReadiness(
  db: Kysely<DB>,
  of: ReadinessOf,
  at: Date,
  onDay: CalendarDay | null = null,
): Promise<ReadinessRow[]> {
  const among = (unit: string, dock: string) => {
    if ('unitId' in of) return sql`${sql.ref(unit)} = ${of.unitId}::uuid`;
    return of.dockIds === 'all' ? sql`true` : sql`${sql.ref(dock)} = any(${[...of.dockIds]}::uuid[])`;
  };
  const { rows } = await sql<ReadinessRow>`
    with holding as (
      select h.unit_id, json_agg(json_build_object(
               'reason', h.reason, 'rule_id', h.rule_id, 'rule_name', r.name, 'task_id', h.task_id,
               'defect_id', h.defect_id, 'defect_title', f.title, 'lay_up_id', h.lay_up_id, 'lay_up_reason', l.reason,
               'since', h.since, 'point', to_json(p))
               order by h.since, h.reason, r.name, h.trigger_index, h.defect_id) as holds
        from unit_hold(${at}, ${onDay}::date) h
        left join rule r on r.id = h.rule_id
        left join due_point p
          on p.unit_id = h.unit_id and p.rule_id = h.rule_id and p.trigger_index = h.trigger_index
        left join defect f on f.id = h.defect_id
        left join lay_up l on l.id = h.lay_up_id
       where ${among('h.unit_id', 'h.dock_id')}
       group by h.unit_id
    )
    select u.id, u.fleet_number, u.dock_id, d.time_zone, model.name as model_name,
           coalesce(u.carb_count_override, model.carb_count) as carb_count,
           m.engine_hours_tenths, m.outing_count, m.read_at,
           room.tenths_to_hold, room.hours_rule_id, hr.name as hours_rule_name,
           room.outings_to_hold, room.outings_rule_id, tr.name as outings_rule_name,
           room.days_to_hold, room.days_rule_id, dr.name as days_rule_name,
           holding.holds, o.id as outing_id, o.started_at, o.due_back_at
      from unit u
      join model on model.id = u.model_id
      join dock d on d.id = u.dock_id
      join live_meter m on m.unit_id = u.id
      left join unit_room(${at}, ${onDay}::date) room on room.unit_id = u.id
      left join rule hr on hr.id = room.hours_rule_id
      left join rule tr on tr.id = room.outings_rule_id
      left join rule dr on dr.id = room.days_rule_id
      left join holding on holding.unit_id = u.id
      left join outing o on o.unit_id = u.id and o.ended_at is null and o.voided_at is null
     where u.retired_at is null and ${among('u.id', 'u.dock_id')}`.execute(db);
  return rows;
}
