import { sql } from 'kysely';
import { beforeEach, describe, expect, test } from 'vitest';
import { refreshDue } from '@/lib/actions/refresh-due';
import { SYSTEM } from '@/lib/domain/access';
import type { Rule } from '@/lib/schemas/rule';
import { addCraft, addDock, addModel } from '../support/craft';
import { testDatabase } from '../support/database';
import { testApi, type Caller } from '../support/http';

const database = testDatabase();
const api = testApi(database);

let manager: Caller;
let twin: string;
let none: string;
let [north, south] = ['', ''];
let [twinNorth, twinSouth, noneNorth] = ['', '', ''];

beforeEach(async () => {
  const { db } = database;
  manager = await api.caller('manager', { name: 'Ines Marlow' });
  north = await addDock(db, 'North dock');
  south = await addDock(db, 'South dock', 'America/Chicago');
  twin = await addModel(db, 'Twin');
  none = await addModel(db, 'Injected', { stroke: 'four', carb_count: 0 });
  twinNorth = await addCraft(db, {
    fleetNumber: 'T-1',
    modelId: twin,
    dockId: north,
    engineHoursTenths: 400,
  });
  twinSouth = await addCraft(db, { fleetNumber: 'T-2', modelId: twin, dockId: south, engineHoursTenths: 40 });
  noneNorth = await addCraft(db, { fleetNumber: 'N-1', modelId: none, dockId: north });
  await work();
});

/** What the worker does with what is queued: each unit's refresh. */
const work = () =>
  refreshDue(
    { db: database.db, actor: SYSTEM, now: new Date() },
    { unitIds: [twinNorth, twinSouth, noneNorth] },
  );

/** Fleet numbers held as not yet assessed, and for what is overdue. */
async function holds(reason: 'not_assessed' | 'overdue'): Promise<string[]> {
  const { rows } = await sql<{ fleet_number: string }>`
    select distinct fleet_number from unit_hold(now(), null) h join unit u on u.id = h.unit_id
     where h.reason = ${reason} order by 1`.execute(database.db);
  return rows.map((row) => row.fleet_number);
}

async function queuedUnits(): Promise<string[]> {
  const { rows } = await sql<{ unit_id: string }>`
    select json_array_elements_text(payload -> 'unitIds') as unit_id from graphile_worker._private_jobs`.execute(
    database.db,
  );
  return rows.map((row) => row.unit_id).sort();
}

const carbs = {
  name: 'Carburettor rebuild',
  kind: 'rebuild',
  appliesTo: { carbCount: { min: 1 } },
  triggers: [{ on: 'engine_hours', every: 25 }],
  lead: { hours: 5 },
  window: { earlyHours: 2.5, lateHours: 2.5 },
  labour: { baseMinutes: 60, perCarbMinutes: 45 },
};

describe('a rule that is saved', () => {
  test('is answered whole, with what was left out as 0, and how many units it covers', async () => {
    const { status, body } = await manager.send<Rule>('POST', '/rules', carbs);
    expect(status).toBe(201);
    expect(body).toMatchObject({
      ...carbs,
      triggers: [{ on: 'engine_hours', every: 25, anchor: 'scheduled' }],
      lead: { hours: 5, outings: 0, days: 0 },
      window: { earlyHours: 2.5, lateHours: 2.5, earlyOutings: 0, lateOutings: 0, earlyDays: 0, lateDays: 0 },
      labour: { baseMinutes: 60, perCarbMinutes: 45, perEngineMinutes: 0 },
      holdsUnit: true,
      parts: [],
      procedureId: null,
      revision: 1,
      unitCount: 2,
      changedBy: 'Ines Marlow',
    });
    expect((await manager.send('GET', `/rules/${body.id}`)).body).toEqual(body);
  });

  test('holds the units it is for, and no other, until the worker has looked', async () => {
    await manager.send('POST', '/rules', carbs);
    expect(await holds('not_assessed')).toEqual(['T-1', 'T-2']);
    expect(await queuedUnits()).toEqual([twinNorth, twinSouth].sort());
    await work();
    expect(await holds('not_assessed')).toEqual([]);
    // 40.0 h run, due at 25 h and overdue from 27.5 h on; 4.0 h run is short of 20 h, where it is upcoming.
    expect(await holds('overdue')).toEqual(['T-1']);
    const { body } = await manager.send('GET', '/rules');
    expect(body.items).toMatchObject([
      { name: carbs.name, unitCount: 2, states: { overdue: 1, due: 0, upcoming: 0 } },
    ]);
  });

  test('given another scope holds the units it was for and those it is for', async () => {
    const { body } = await manager.send('POST', '/rules', { ...carbs, appliesTo: { dockIds: [south] } });
    await work();
    await database.db.deleteFrom('due_point').where('unit_id', '=', noneNorth).execute();
    const changed = await manager.send('PUT', `/rules/${body.id}`, {
      ...carbs,
      appliesTo: { modelIds: [none] },
    });
    expect(changed).toMatchObject({ status: 200, body: { unitCount: 1, revision: 2 } });
    expect(await holds('not_assessed')).toEqual(['N-1', 'T-2']);
    await work();
    const points = await database.db.selectFrom('due_point').select('unit_id').execute();
    expect(points.map((point) => point.unit_id)).toEqual([noneNorth]);
  });

  test('with another name alone moves no due point, so nothing is held', async () => {
    const { body } = await manager.send('POST', '/rules', carbs);
    await work();
    const renamed = await manager.send('PUT', `/rules/${body.id}`, { ...carbs, name: 'Carbs', revision: 1 });
    expect(renamed).toMatchObject({ status: 200, body: { name: 'Carbs', revision: 2 } });
    expect(await holds('not_assessed')).toEqual([]);
  });

  test('is not overwritten by somebody who edited an older one: they learn who changed it', async () => {
    const { body } = await manager.send('POST', '/rules', carbs);
    const other = await api.caller('manager', { name: 'Ruben Hale' });
    await other.send('PUT', `/rules/${body.id}`, { ...carbs, holdsUnit: false });
    const late = await manager.send('PUT', `/rules/${body.id}`, { ...carbs, kind: 'service', revision: 1 });
    expect(late).toMatchObject({ status: 409, body: { code: 'conflict', errors: [{ path: 'revision' }] } });
    expect(late.body.detail).toContain('Ruben Hale');
    expect((await manager.send('GET', `/rules/${body.id}`)).body).toMatchObject({
      kind: 'rebuild',
      revision: 2,
    });
  });

  test('that ends frees its units at once, keeps its record, and can be opened again', async () => {
    const { body } = await manager.send('POST', '/rules', carbs);
    await work();
    const ended = await manager.send('POST', `/rules/${body.id}/ending`, { reason: 'All injected now.' });
    expect(ended).toMatchObject({
      status: 200,
      body: { endedBy: 'Ines Marlow', endReason: 'All injected now.' },
    });
    expect(await holds('overdue')).toEqual([]);
    expect(await holds('not_assessed')).toEqual([]);
    expect((await manager.send('GET', '/rules')).body.items).toEqual([]);
    expect((await manager.send('GET', '/rules?ended=include')).body.items).toMatchObject([{ id: body.id }]);
    await work();
    expect(await database.db.selectFrom('due_point').selectAll().execute()).toEqual([]);
    const change = await manager.send('PUT', `/rules/${body.id}`, carbs);
    expect(change).toMatchObject({ status: 409, body: { errors: [{ path: 'id' }] } });

    expect((await manager.send('DELETE', `/rules/${body.id}/ending`)).body).toMatchObject({ endedAt: null });
    expect(await holds('not_assessed')).toEqual(['T-1', 'T-2']);
    await work();
    expect(await holds('overdue')).toEqual(['T-1']);
  });

  test('keeps its name to itself while it is in force', async () => {
    const { body } = await manager.send('POST', '/rules', carbs);
    const again = await manager.send('POST', '/rules', { ...carbs, name: 'carburettor REBUILD' });
    expect(again).toMatchObject({ status: 409, body: { errors: [{ path: 'name' }] } });
    await manager.send('POST', `/rules/${body.id}/ending`, {});
    expect((await manager.send('POST', '/rules', carbs)).status).toBe(201);
    const reopened = await manager.send('DELETE', `/rules/${body.id}/ending`);
    expect(reopened).toMatchObject({ status: 409, body: { errors: [{ path: 'name' }] } });
  });

  test('of a fleet of 450 units is queued in batches of at most 200', async () => {
    for (let index = 0; index < 450; index += 1)
      await addCraft(database.db, { fleetNumber: `B-${index}`, modelId: twin, dockId: north });
    await manager.send('POST', '/rules', carbs);
    const { rows } = await sql<{ units: number }>`
      select json_array_length(payload -> 'unitIds') as units from graphile_worker._private_jobs`.execute(
      database.db,
    );
    expect(rows.map((row) => row.units).sort()).toEqual([200, 200, 52]);
  });
});
