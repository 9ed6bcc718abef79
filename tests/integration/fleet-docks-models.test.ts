import { sql } from 'kysely';
import { beforeEach, describe, expect, test } from 'vitest';
import { createRule } from '@/lib/actions/create-rule';
import { refreshDue } from '@/lib/actions/refresh-due';
import type { Dock } from '@/lib/schemas/dock';
import type { Model } from '@/lib/schemas/model';
import { createRule as createRuleInput } from '@/lib/schemas/rule';
import { expectRefused } from '../support/bad-input';
import { asSystem, openDock } from '../support/crew';
import { testDatabase } from '../support/database';
import { testApi, type Caller } from '../support/http';

const database = testDatabase();
const api = testApi(database);

let manager: Caller;
let home: Awaited<ReturnType<typeof openDock>>;

beforeEach(async () => {
  home = await openDock(database.db);
  manager = await api.caller('manager');
});

const holds = async () => {
  const { rows } = await sql<{ reason: string }>`
    select reason from unit_hold(now(), null) where unit_id = ${home.unit.id} order by 1`.execute(
    database.db,
  );
  return rows.map(({ reason }) => reason);
};

const queued = async () => {
  const { rows } = await sql<{ task: string }>`
    select t.identifier as task from graphile_worker._private_jobs j
      join graphile_worker._private_tasks t on t.id = j.task_id order by 1`.execute(database.db);
  return rows.map(({ task }) => task);
};

const work = () => refreshDue(asSystem(database.db, new Date()), { unitIds: [home.unit.id] });

describe('a dock', () => {
  test('changes by what is named alone', async () => {
    const path = `/docks/${home.dock.id}`;
    const { status, body } = await manager.send<Dock>('PATCH', path, {
      season: { from: '05-01', to: '09-30' },
      openWeekdays: ['FR', 'SA', 'SU'],
    });
    expect(status, JSON.stringify(body)).toBe(200);
    expect(body).toEqual({
      ...home.dock,
      season: { from: '05-01', to: '09-30' },
      openWeekdays: ['FR', 'SA', 'SU'],
    });
    expect((await manager.send<Dock>('PATCH', path, { season: null })).body.season).toBeNull();
    expect((await manager.send<Dock>('GET', path)).body.openWeekdays).toEqual(['FR', 'SA', 'SU']);
  });

  test('in another time zone has its units looked at again, without holding them', async () => {
    await sql`delete from graphile_worker._private_jobs`.execute(database.db);
    await manager.send('PATCH', `/docks/${home.dock.id}`, { name: 'Cais Velho' });
    expect(await queued()).toEqual([]);
    await manager.send('PATCH', `/docks/${home.dock.id}`, { timeZone: 'America/New_York' });
    expect(await queued()).toEqual(['refresh-due']);
    expect(await holds()).toEqual([]);
  });

  test('is changed by managers of all docks only, and never to nonsense', async () => {
    const path = `/docks/${home.dock.id}`;
    const mechanic = await api.caller('mechanic');
    const ofOne = await api.caller('manager', { dockIds: [home.dock.id] });
    const change = { method: 'PATCH', path, body: { name: 'Mine' }, status: 403 };
    await expectRefused(database.db, mechanic, change);
    await expectRefused(database.db, ofOne, change);
    const other = await openDock(database.db, { name: 'Cais Sul', fleetNumber: 'S-1' });
    for (const [body, field] of [
      [{ timeZone: 'Lisbon' }, 'timeZone'],
      [{ season: { from: '02-30', to: '09-01' } }, 'season.from'],
      [{ openWeekdays: [] }, 'openWeekdays'],
      [{ id: other.dock.id }, 'id'],
      [{}, ''],
    ] as const)
      await expectRefused(database.db, manager, { method: 'PATCH', path, body, status: 422, field });
    await expectRefused(database.db, manager, {
      method: 'PATCH',
      path,
      body: { name: 'cais sul' },
      status: 409,
      field: 'name',
    });
  });
});

describe('a model', () => {
  const path = () => `/models/${home.model.id}`;

  test('keeps its specs by name', async () => {
    const specs = {
      Compression: { min: 150, max: 180, unit: 'psi' },
      'Plug gap': { target: 0.6, unit: 'mm' },
    };
    expect((await manager.send<Model>('PATCH', path(), { specs })).body.specs).toEqual(specs);
    expect((await manager.send<Model>('GET', path())).body.specs).toEqual(specs);
  });

  test('that gets carburettors of another rule holds its units until they are assessed', async () => {
    await createRule(
      asSystem(database.db, new Date()),
      createRuleInput.parse({
        name: 'Quad carburettor sync',
        kind: 'service',
        appliesTo: { carbCount: { min: 4 } },
        triggers: [{ on: 'engine_hours', every: 50 }],
      }),
    );
    await work();
    expect(await holds()).toEqual([]);
    await manager.send('PATCH', path(), { name: 'Quad' });
    expect(await holds()).toEqual([]);
    await manager.send('PATCH', path(), { carbCount: 4, cylinders: 4 });
    expect(await holds()).toEqual(['not_assessed']);
    await work();
    // 100.0 h on the meter, and never done: due at 50 h.
    expect(await holds()).toEqual(['overdue']);
  });

  test('never contradicts itself', async () => {
    for (const [body, field] of [
      [{ propulsion: 'electric' }, 'stroke'],
      [{ propulsion: 'electric', stroke: null }, 'carbCount'],
      [{ stroke: null }, 'stroke'],
      [{ engines: 0 }, 'engines'],
      [{ specs: { Compression: { min: 9, max: 3 } } }, 'specs.Compression.max'],
      [{ specs: { Compression: { least: 9 } } }, 'specs.Compression.least'],
      [{ specs: { Compression: { unit: 'p\u0000si' } } }, 'specs.Compression.unit'],
    ] as const)
      await expectRefused(database.db, manager, { method: 'PATCH', path: path(), body, status: 422, field });
  });
});
