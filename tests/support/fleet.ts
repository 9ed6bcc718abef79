import { randomUUID } from 'node:crypto';
import { sql, type Kysely } from 'kysely';
import type { DB } from '@/db/tables';

type Options = {
  /** Tenths of an engine hour between duties of the one rule. */
  every?: number;
  lead?: number;
  engineHoursTenths?: number;
  timeZone?: string;
};

/** A dock with one unit and one hourly rule that holds it, put in by SQL: for tests of what comes after. */
export async function addUnit(db: Kysely<DB>, options: Options = {}) {
  const { every = 500, lead = 0, engineHoursTenths = 0, timeZone = 'America/New_York' } = options;
  const name = randomUUID().slice(0, 8);
  const { rows } = await sql<{ dock_id: string; unit_id: string; rule_id: string }>`
    with d as (insert into dock (name, time_zone) values (${`Dock ${name}`}, ${timeZone}) returning id),
    m as (insert into model (name, propulsion, stroke, engines, cylinders, carb_count)
      values (${`Model ${name}`}, 'jet', 'two', 1, 2, 2) returning id),
    u as (insert into unit (fleet_number, model_id, dock_id, entered_service_on)
      select ${`U-${name}`}, m.id, d.id, '2026-01-01' from m, d returning id),
    l as (insert into live_meter (unit_id, read_at, base_tenths, shown_tenths, engine_hours_tenths, outing_count)
      select id, now(), 0, ${engineHoursTenths}, ${engineHoursTenths}, 0 from u),
    a as (insert into assessment (unit_id) select id from u),
    r as (insert into rule (name, kind, scope, triggers, lead, tolerance, holds_unit, labour)
      values (${`Rule ${name}`}, 'service', '{}',
        ${JSON.stringify([{ on: 'engine_hours', every, anchor: 'scheduled' }])}::jsonb,
        ${JSON.stringify({ tenths: lead, outings: 0, days: 0 })}::jsonb,
        '{"earlyTenths":0,"lateTenths":0,"earlyOutings":0,"lateOutings":0,"earlyDays":0,"lateDays":0}', true,
        '{"baseMinutes":30,"perCarbMinutes":0,"perEngineMinutes":0}') returning id)
    select d.id as dock_id, u.id as unit_id, r.id as rule_id from d, u, r`.execute(db);
  const { dock_id: dockId, unit_id: unitId, rule_id: ruleId } = rows[0]!;
  return { dockId, unitId, ruleId };
}
