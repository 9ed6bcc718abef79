import { beforeAll, describe, expect, test } from 'vitest';
import type { Rule } from '@/lib/schemas/rule';
import { addCraft, addDock, addModel } from '../support/craft';
import { testDatabase } from '../support/database';
import { testApi, type Caller } from '../support/http';

const database = testDatabase({ keep: true });
const api = testApi(database);

let manager: Caller;
let south: string;
let ruleId: string;

const carbs = {
  name: 'Carburettor rebuild',
  kind: 'rebuild',
  appliesTo: { carbCount: { min: 1 } },
  triggers: [{ on: 'engine_hours', every: 25 }],
};

beforeAll(async () => {
  const { db } = database;
  manager = await api.caller('manager');
  const north = await addDock(db, 'North dock');
  south = await addDock(db, 'South dock');
  const modelId = await addModel(db, 'Twin');
  await addCraft(db, { fleetNumber: 'T-1', modelId, dockId: north });
  await addCraft(db, { fleetNumber: 'T-2', modelId, dockId: south });
  ruleId = (await manager.send<Rule>('POST', '/rules', carbs)).body.id;
});

/** All that a write of a rule can change. */
async function records(): Promise<unknown> {
  const { db } = database;
  const rules = await db.selectFrom('rule').selectAll().execute();
  const wanted = await db.selectFrom('assessment').select('wanted_revision').execute();
  return { rules, wanted };
}

const unknown = '5b0c3f5e-6f0e-4f0a-9a51-0d1f8f2b7a11';
const every = (trigger: object) => ({ triggers: [{ on: 'engine_hours', every: 25 }, trigger] });

describe('a rule that cannot be is refused by its field and changes nothing', () => {
  test.each([
    ['name', { name: ' ' }],
    ['name', { name: undefined }],
    ['kind', { kind: 'overhaul' }],
    ['appliesTo', { appliesTo: undefined }],
    ['appliesTo.modelIds', { appliesTo: { modelIds: [] } }],
    ['appliesTo.modelIds.0', { appliesTo: { modelIds: ['T-1'] } }],
    ['appliesTo.modelIds.0', { appliesTo: { modelIds: [unknown] } }],
    ['appliesTo.dockIds.0', { appliesTo: { dockIds: [unknown] } }],
    ['appliesTo.stroke', { appliesTo: { stroke: 'three' } }],
    ['appliesTo.carbCount.max', { appliesTo: { carbCount: { min: 3, max: 2 } } }],
    ['appliesTo.carbCount.min', { appliesTo: { carbCount: { min: -1 } } }],
    ['appliesTo.colour', { appliesTo: { colour: 'red' } }],
    ['triggers', { triggers: [] }],
    ['triggers', { triggers: Array(9).fill({ on: 'outings', every: 10 }) }],
    ['triggers', { triggers: 'FREQ=DAILY' }],
    ['triggers.1.on', every({ on: 'moon', every: 2 })],
    ['triggers.1.every', every({ on: 'engine_hours' })],
    ['triggers.1.every', every({ on: 'engine_hours', every: 0 })],
    ['triggers.1.every', every({ on: 'engine_hours', every: -25 })],
    ['triggers.1.every', every({ on: 'engine_hours', every: 2.55 })],
    ['triggers.1.every', every({ on: 'engine_hours', every: 1e9 })],
    ['triggers.1.every', every({ on: 'engine_hours', every: '25' })],
    ['triggers.1.every', every({ on: 'outings', every: 2.5 })],
    ['triggers.1.every', every({ on: 'outings', every: 0 })],
    ['triggers.1.first', every({ on: 'outings', every: 5, first: -1 })],
    ['triggers.1.anchor', every({ on: 'outings', every: 5, anchor: 'guessed' })],
    ['triggers.1.rrule', every({ on: 'calendar', rrule: 'FREQ=HOURLY', start: '2026-01-01' })],
    ['triggers.1.rrule', every({ on: 'calendar', rrule: '', start: '2026-01-01' })],
    [
      'triggers.1.rrule',
      every({ on: 'calendar', rrule: 'FREQ=YEARLY;BYMONTH=2;BYMONTHDAY=30', start: '2026-01-01' }),
    ],
    ['triggers.1.rrule', every({ on: 'calendar', rrule: 'FREQ=DAILY;UNTIL=20251231', start: '2026-01-01' })],
    ['triggers.1.start', every({ on: 'calendar', rrule: 'FREQ=DAILY', start: '2026-02-30' })],
    ['triggers.1.every', every({ on: 'calendar', rrule: 'FREQ=DAILY', start: '2026-01-01', every: 2 })],
    ['lead.hours', { lead: { hours: -1 } }],
    ['lead.days', { lead: { days: 1.5 } }],
    ['lead.weeks', { lead: { weeks: 1 } }],
    ['window.earlyHours', { window: { earlyHours: -0.1 } }],
    ['window.lateHours', { window: { lateHours: -0.1 } }],
    ['window.earlyHours', { window: { earlyHours: 25 } }],
    ['window.earlyOutings', { triggers: [{ on: 'outings', every: 10 }], window: { earlyOutings: 10 } }],
    ['window.lateDays', { window: { lateDays: 40_000 } }],
    ['holdsUnit', { holdsUnit: 'yes' }],
    ['labour.perCarbMinutes', { labour: { perCarbMinutes: -5 } }],
    ['parts.0.partId', { parts: [{ partId: unknown, quantity: 1, per: 'carb' }] }],
    ['parts.0.quantity', { parts: [{ partId: unknown, quantity: 0, per: 'carb' }] }],
    ['parts.0.per', { parts: [{ partId: unknown, quantity: 1, per: 'hull' }] }],
    ['procedureId', { procedureId: unknown }],
    ['procedureId', { procedureId: 'rebuild' }],
    ['color', { color: 'red' }],
  ])('%s (case %#)', async (path, part) => {
    const before = await records();
    for (const [method, to] of [
      ['POST', '/rules'],
      ['PUT', `/rules/${ruleId}`],
    ] as const) {
      const refused = await manager.send(method, to, {
        ...carbs,
        ...(method === 'POST' && { name: 'New' }),
        ...part,
      });
      expect(refused.status).toBe(422);
      expect(refused.body.errors).toContainEqual({ path, message: expect.stringMatching(/\w/) as unknown });
    }
    expect(await records()).toEqual(before);
  });

  test('and so are broken JSON, an id that is none, and a rule nobody wrote', async () => {
    expect(await manager.send('POST', '/rules', '{"name":')).toMatchObject({ status: 400 });
    expect(await manager.send('GET', '/rules/carbs')).toMatchObject({
      status: 422,
      body: { errors: [{ path: 'id' }] },
    });
    for (const [method, to, body] of [
      ['GET', `/rules/${unknown}`],
      ['PUT', `/rules/${unknown}`, carbs],
      ['POST', `/rules/${unknown}/ending`, {}],
      ['DELETE', `/rules/${unknown}/ending`],
    ] as const)
      expect(await manager.send(method, to, body)).toMatchObject({
        status: 404,
        body: { errors: [{ path: 'id' }] },
      });
  });

  test.each([
    ['a mechanic', 'mechanic', false],
    ['a dock hand', 'dock', false],
    ['a manager of one dock only', 'manager', true],
  ] as const)('%s may read rules and preview them, not write them', async (_, role, oneDock) => {
    const before = await records();
    const person = await api.caller(role, { dockIds: oneDock ? [south] : [] });
    expect((await person.send('GET', '/rules')).body.items).toMatchObject([{ unitCount: oneDock ? 1 : 2 }]);
    for (const [method, to, sent] of [
      ['POST', '/rules', { ...carbs, name: 'New' }],
      ['PUT', `/rules/${ruleId}`, carbs],
      ['POST', `/rules/${ruleId}/ending`, {}],
      ['DELETE', `/rules/${ruleId}/ending`],
    ] as const)
      expect(await person.send(method, to, sent)).toMatchObject({ status: 403, body: { code: 'forbidden' } });
    expect(await records()).toEqual(before);
  });
});
