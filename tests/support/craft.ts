import type { Kysely } from 'kysely';
import type { DB, ModelTable } from '@/db/tables';
import type { Insertable } from 'kysely';

/** Adds a dock by name. */
export async function addDock(db: Kysely<DB>, name: string, timeZone = 'America/New_York'): Promise<string> {
  const row = { name, time_zone: timeZone, season_from: null, season_to: null };
  const { id } = await db.insertInto('dock').values(row).returning('id').executeTakeFirstOrThrow();
  return id;
}

/** Adds a model: a two-stroke jet with a carburettor for each of its two cylinders, unless told otherwise. */
export async function addModel(
  db: Kysely<DB>,
  name: string,
  options: Partial<Insertable<ModelTable>> = {},
): Promise<string> {
  const twin = { propulsion: 'jet', stroke: 'two', engines: 1, cylinders: 2, carb_count: 2 } as const;
  const { id } = await db
    .insertInto('model')
    .values({ name, ...twin, ...options })
    .returning('id')
    .executeTakeFirstOrThrow();
  return id;
}

/** Adds a unit that came with these engine hours (in tenths) and outings, and needs assessing. */
export async function addCraft(
  db: Kysely<DB>,
  unit: {
    fleetNumber: string;
    modelId: string;
    dockId: string;
    engineHoursTenths?: number;
    outings?: number;
  },
): Promise<string> {
  const { engineHoursTenths = 0, outings = 0 } = unit;
  const { id } = await db
    .insertInto('unit')
    .values({
      fleet_number: unit.fleetNumber,
      model_id: unit.modelId,
      dock_id: unit.dockId,
      hin: null,
      registration: null,
      entered_service_on: '2026-01-01',
      created_at: new Date('2026-01-01T12:00:00Z'),
      carb_count_override: null,
      created_by: null,
      retired_by: null,
    })
    .returning('id')
    .executeTakeFirstOrThrow();
  await db
    .insertInto('live_meter')
    .values({
      unit_id: id,
      reading_id: null,
      read_at: new Date('2026-01-01T12:00:00Z'),
      base_tenths: 0,
      shown_tenths: engineHoursTenths,
      engine_hours_tenths: engineHoursTenths,
      starting_outings: outings,
      outing_count: outings,
    })
    .execute();
  await db.insertInto('assessment').values({ unit_id: id, assessed_at: null }).execute();
  return id;
}
