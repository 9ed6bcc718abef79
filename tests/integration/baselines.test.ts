import { sql } from 'kysely';
import { beforeEach, describe, expect, test } from 'vitest';
import { refreshDue } from '@/lib/actions/refresh-due';
import { SYSTEM } from '@/lib/domain/access';
import type { Baseline } from '@/lib/schemas/baseline';
import type { Rule } from '@/lib/schemas/rule';
import { addCraft, addDock, addModel } from '../support/craft';
import { testDatabase } from '../support/database';
import { testApi, type Caller } from '../support/http';

const database = testDatabase();
const api = testApi(database);

let manager: Caller;
let mechanic: Caller;
let [unitId, north, south, ruleId] = ['', '', '', ''];

beforeEach(async () => {
  const { db } = database;
  north = await addDock(db, 'North dock');
  south = await addDock(db, 'South dock');
  manager = await api.caller('manager');
  mechanic = await api.caller('mechanic', { dockIds: [north], name: 'Ada Quill' });
  const modelId = await addModel(db, 'Twin');
  unitId = await addCraft(db, {
    fleetNumber: 'T-1',
    modelId,
    dockId: north,
    engineHoursTenths: 4000,
    outings: 300,
  });
  const rule = {
    name: 'Oil and filter',
    kind: 'service',
    appliesTo: { dockIds: [north] },
    triggers: [
      { on: 'engine_hours', every: 50 },
      { on: 'outings', every: 100 },
      { on: 'calendar', rrule: 'FREQ=YEARLY', start: '2026-01-01', anchor: 'completed' },
    ],
    lead: { hours: 10 },
    window: { earlyHours: 5, lateHours: 5, lateDays: 14 },
  };
  ruleId = (await manager.send<Rule>('POST', '/rules', rule)).body.id;
  await work();
});

const work = () => refreshDue({ db: database.db, actor: SYSTEM, now: new Date() }, { unitIds: [unitId] });

const last = {
  closedOn: '2026-02-10',
  engineHours: 360.5,
  outings: 270,
  note: 'The log of the owner before us.',
};
const record = (caller: Caller, part: object = {}) =>
  caller.send<Baseline>('POST', `/units/${unitId}/baselines`, { ruleId, ...last, ...part });

async function holds(): Promise<string[]> {
  const { rows } = await sql<{
    reason: string;
  }>`select distinct reason from unit_hold(now(), null) order by 1`.execute(database.db);
  return rows.map((row) => row.reason);
}

describe('a craft that comes with a past', () => {
  test('is overdue without a baseline, held while it is worked in, and free after', async () => {
    expect(await holds()).toEqual(['overdue']);
    const { status, body } = await record(mechanic);
    expect(status).toBe(201);
    expect(body).toMatchObject({
      ...last,
      ruleId,
      ruleName: 'Oil and filter',
      recordedBy: 'Ada Quill',
      withdrawnAt: null,
    });
    expect(await holds()).toEqual(['not_assessed', 'overdue']);
    await work();
    expect(await holds()).toEqual([]);
    expect((await mechanic.send('GET', `/units/${unitId}/baselines`)).body).toEqual({
      items: [body],
      nextCursor: null,
    });
  });

  test('shows what is due, how it stands and what is left under each of its rules', async () => {
    await record(mechanic);
    const before = await mechanic.send('GET', `/units/${unitId}/due-points`);
    expect(before.body).toMatchObject({ assessed: false });
    await work();
    const { body } = await mechanic.send('GET', `/units/${unitId}/due-points`);
    // By hand: first due at 50 h and 100 outings, closed outside both windows, so 360.5 + 50 and 270 + 100; a year after.
    expect(body).toMatchObject({
      unitId,
      engineHours: 400,
      outings: 300,
      assessed: true,
      items: [
        {
          ruleId,
          ruleName: 'Oil and filter',
          holdsUnit: true,
          lastDone: { on: '2026-02-10', engineHours: 360.5, outings: 270 },
          triggers: [
            {
              on: 'engine_hours',
              due: { hours: 410.5 },
              overdueFrom: { hours: 415.5 },
              left: { hours: 10.5 },
              leftToOverdue: { hours: 15.5 },
              state: 'clear',
            },
            { on: 'outings', due: { outings: 370 }, overdueFrom: { outings: 370 }, left: { outings: 70 } },
            { on: 'calendar', due: { date: '2027-02-10' }, overdueFrom: { date: '2027-02-25' } },
          ],
        },
      ],
    });
  });

  test('whose outings are not said: none are taken for days before it came, all it came with after', async () => {
    expect((await record(mechanic, { closedOn: '2025-12-01', outings: undefined })).body.outings).toBe(0);
    expect((await record(mechanic, { closedOn: '2026-02-10', outings: undefined })).body.outings).toBe(300);
  });

  test('falls back to what it was when a manager withdraws the baseline, once', async () => {
    const { body } = await record(mechanic);
    await work();
    const path = `/units/${unitId}/baselines/${body.id}/withdrawal`;
    expect((await mechanic.send('POST', path)).status).toBe(403);
    expect((await manager.send('POST', path)).body).toMatchObject({ withdrawnBy: 'manager' });
    expect(await holds()).toEqual(['not_assessed']);
    await work();
    expect(await holds()).toEqual(['overdue']);
    expect(await manager.send('POST', path)).toMatchObject({
      status: 409,
      body: { errors: [{ path: 'baselineId' }] },
    });
    expect((await manager.send('GET', `/units/${unitId}/baselines`)).body.items).toMatchObject([
      { id: body.id },
    ]);
  });
});

const unknown = '5b0c3f5e-6f0e-4f0a-9a51-0d1f8f2b7a11';

test('a baseline that cannot be is refused by its field and changes nothing', async () => {
  const tomorrow = new Date(Date.now() + 2 * 86_400_000).toISOString().slice(0, 10);
  for (const [status, path, part] of [
    [422, 'closedOn', { closedOn: tomorrow }],
    [422, 'closedOn', { closedOn: '2026-02-29' }],
    [422, 'engineHours', { engineHours: 400.1 }],
    [422, 'engineHours', { engineHours: -1 }],
    [422, 'outings', { outings: 301 }],
    [422, 'note', { note: '' }],
    [422, 'ruleId', { ruleId: 'oil' }],
    [404, 'ruleId', { ruleId: unknown }],
    [422, 'by', { by: 'me' }],
  ] as const) {
    const refused = await record(mechanic, part);
    expect(refused).toMatchObject({ status, body: { errors: [{ path }] } });
  }
  const moved = await manager.send('POST', `/units/${unknown}/baselines`, { ruleId, ...last });
  expect(moved).toMatchObject({ status: 404, body: { errors: [{ path: 'id' }] } });
  expect(await database.db.selectFrom('baseline').selectAll().execute()).toEqual([]);
  expect(await holds()).toEqual(['overdue']);
});

test('a rule that is not for the unit, or has ended, takes no baseline', async () => {
  const elsewhere = {
    name: 'South only',
    kind: 'service',
    appliesTo: { dockIds: [south] },
    triggers: [{ on: 'outings', every: 5 }],
  };
  const { body } = await manager.send('POST', '/rules', elsewhere);
  expect(await record(manager, { ruleId: body.id })).toMatchObject({
    status: 422,
    body: { errors: [{ path: 'ruleId' }] },
  });
  await manager.send('POST', `/rules/${ruleId}/ending`, {});
  expect(await record(manager)).toMatchObject({ status: 422, body: { errors: [{ path: 'ruleId' }] } });
});

test('a dock hand, and a mechanic of another dock, may not record one', async () => {
  const others = [
    await api.caller('dock', { dockIds: [north] }),
    await api.caller('mechanic', { dockIds: [south] }),
  ];
  for (const other of others) expect((await record(other)).status).toBe(403);
  expect((await others[1]!.send('GET', `/units/${unitId}/due-points`)).status).toBe(403);
  expect(await database.db.selectFrom('baseline').selectAll().execute()).toEqual([]);
});
