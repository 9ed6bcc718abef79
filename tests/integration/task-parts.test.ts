import { randomUUID } from 'node:crypto';
import { beforeEach, describe, expect, test } from 'vitest';
import type { TaskParts } from '@/lib/schemas/task-parts';
import { expectRefused } from '../support/bad-input';
import { testDatabase } from '../support/database';
import { testApi } from '../support/http';
import { addPart } from '../support/stock';
import { makeWorkshop } from '../support/workshop';

const database = testDatabase();
const api = testApi(database);

let shop: Awaited<ReturnType<typeof makeWorkshop>>;
beforeEach(async () => {
  shop = await makeWorkshop(database, api);
});

describe('a task needs', () => {
  test('what its rule asks for on a unit like this, and says what is here and at other docks', async () => {
    await shop.stock(shop.kit, 1);
    await shop.stock(shop.kit, 4, shop.south);
    const taskId = await shop.taskOf(shop.perCarb);
    expect(await shop.partsOf(taskId)).toEqual([
      {
        ...{ partId: shop.kit, number: 'CARBURETTOR-KIT', name: 'Carburettor kit', isKit: false, needed: 2 },
        ...{ onHand: 1, reserved: 0, free: 1, short: 1, canMakeUp: 0 },
        elsewhere: [{ dockId: shop.south, dockName: 'Cais Sul', free: 4, reserved: 0 }],
      },
      {
        ...{ partId: shop.plug, number: 'PLUG', name: 'Plug', isKit: false, needed: 2 },
        ...{ onHand: 0, reserved: 0, free: 0, short: 2, canMakeUp: 0, elsewhere: [] },
      },
    ]);
    const local = await api.caller('mechanic', { dockIds: [shop.home.dock.id] });
    expect((await shop.partsOf(taskId, local))[0]!.elsewhere).toEqual([]);
  });

  test('nothing without a rule until somebody says so, and then as many as was said last', async () => {
    const taskId = await shop.repair();
    expect(await shop.partsOf(taskId)).toEqual([]);
    const say = (quantity: number) =>
      shop.mechanic.send<TaskParts>('PUT', `/tasks/${taskId}/needs`, { partId: shop.plug, quantity });
    expect((await say(3)).body.parts).toMatchObject([{ name: 'Plug', needed: 3, short: 3 }]);
    expect((await say(1)).body.parts).toMatchObject([{ needed: 1 }]);
    expect((await say(0)).body.parts).toEqual([]);
  });

  test('of a kit says how many could be made up of the parts that are free here', async () => {
    const gasket = (await addPart(database.db, 'Gasket')).id;
    const built = (await addPart(database.db, 'Pump kit', [{ partId: gasket, quantity: 2 }])).id;
    await shop.stock(gasket, 5);
    const taskId = await shop.taskOf([{ partId: built, quantity: 1, per: 'unit' }]);
    expect(await shop.partsOf(taskId)).toMatchObject([
      { name: 'Pump kit', isKit: true, short: 1, canMakeUp: 2 },
    ]);
  });

  test('that follows up one carburettor only what that one takes, once', async () => {
    const procedure = async (steps: object[]) =>
      (
        await shop.manager.send<{ id: string }>('POST', '/procedures', {
          ...{ name: `P ${randomUUID()}`, kind: 'rebuild', steps },
        })
      ).body.id;
    const look = (more: object = {}) => ({ key: 'look', kind: 'check', title: 'Look', per: 'carb', ...more });
    const rebuild = await procedure([look()]);
    const onFail = {
      open: 'task',
      kind: 'rebuild',
      title: 'Rebuild',
      holdsUnit: false,
      procedureId: rebuild,
    };
    await shop.taskOf(shop.perCarb, { procedureId: rebuild });
    const inspection = await shop.open({
      kind: 'inspection',
      title: 'Inspect',
      procedureId: await procedure([look({ onFail })]),
    });
    expect(await shop.partsOf(inspection)).toEqual([]);
    await shop.mechanic.send('POST', `/tasks/${inspection}/entries`, {
      ...{ id: randomUUID(), stepKey: 'look', place: 2, value: { kind: 'check', outcome: 'fail' } },
    });
    const id = randomUUID();
    await shop.mechanic.send('POST', `/tasks/${inspection}/follow-ups`, { id, stepKey: 'look', place: 2 });
    expect(await shop.partsOf(id)).toMatchObject([{ name: 'Carburettor kit', needed: 1 }]);
  });
});

describe('parts are set aside', () => {
  test('in one go as far as they are here, and are no longer free for other work', async () => {
    await shop.stock(shop.kit, 3);
    const [first, second] = [await shop.taskOf(shop.perCarb), await shop.taskOf(shop.perCarb)];
    expect((await shop.reserve(first)).body.parts[0]).toMatchObject({ reserved: 2, free: 3, short: 0 });
    expect((await shop.reserve(first)).body.parts[0]).toMatchObject({ reserved: 2 });
    expect((await shop.reserve(second)).body.parts[0]).toMatchObject({ reserved: 1, free: 1, short: 1 });
    const { body } = await shop.manager.send<{ levels: object[]; reservedFor: object[] }>(
      'GET',
      `/parts/${shop.kit}`,
    );
    expect(body.levels).toMatchObject([{ onHand: 3, reserved: 3, free: 0 }]);
    expect(body.reservedFor).toMatchObject([
      { taskId: first, quantity: 2 },
      { taskId: second, quantity: 1 },
    ]);
  });

  test('when the task is started, and released when it is withdrawn, closed, or by hand', async () => {
    await shop.stock(shop.plug, 2);
    const taskId = await shop.taskOf(shop.perCarb);
    await shop.mechanic.send('PATCH', `/tasks/${taskId}`, { started: true });
    expect((await shop.partsOf(taskId))[1]).toMatchObject({ name: 'Plug', reserved: 2 });
    await shop.mechanic.send('DELETE', `/tasks/${taskId}/reservations`);
    expect((await shop.partsOf(taskId))[1]).toMatchObject({ reserved: 0 });
    const other = await shop.repair();
    await shop.setAside(other, { partId: shop.plug, quantity: 2 });
    expect(await shop.partsOf(other)).toMatchObject([{ needed: 0, reserved: 2 }]);
    await shop.mechanic.send('POST', `/tasks/${other}/withdrawal`, { reason: 'Twice the same' });
    await shop.reserve(taskId);
    expect((await shop.partsOf(taskId))[1]).toMatchObject({ reserved: 2 });
    await shop.close(taskId, {});
    const third = await shop.repair();
    expect((await shop.setAside(third, { partId: shop.plug, quantity: 2 })).status).toBe(200);
  });

  test('by hand as many as are free, at another dock too, and no more', async () => {
    await shop.stock(shop.kit, 2);
    await shop.stock(shop.kit, 1, shop.south);
    const taskId = await shop.taskOf(shop.perCarb);
    const path = `/tasks/${taskId}/reservations`;
    await expectRefused(database.db, shop.mechanic, {
      ...{ method: 'PUT', path, body: { partId: shop.kit, quantity: 3 }, status: 409, field: 'quantity' },
    });
    await shop.setAside(taskId, { partId: shop.kit, quantity: 1 });
    const there = await shop.setAside(taskId, { partId: shop.kit, quantity: 1, dockId: shop.south });
    expect(there.body.parts[0]).toMatchObject({
      ...{ reserved: 1, elsewhere: [{ dockId: shop.south, free: 1, reserved: 1 }] },
    });
    const given = await shop.setAside(taskId, { partId: shop.kit, quantity: 0, dockId: shop.south });
    expect(given.body.parts[0]).toMatchObject({ elsewhere: [{ reserved: 0 }] });
    const local = await api.caller('mechanic', { dockIds: [shop.home.dock.id] });
    const far = await local.send('PUT', path, { partId: shop.kit, quantity: 1, dockId: shop.south });
    expect(far).toMatchObject({ status: 403, body: { errors: [{ path: 'dockId' }] } });
  });

  test('for one task, when two want the last one at the same moment', async () => {
    await shop.stock(shop.kit, 1);
    const tasks = [await shop.repair(), await shop.repair(), await shop.repair()];
    const answers = await Promise.all(
      tasks.map((id) => shop.setAside(id, { partId: shop.kit, quantity: 1 })),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409, 409]);
  });

  test('for no task that has ended', async () => {
    await shop.stock(shop.kit, 1);
    const taskId = await shop.repair();
    await shop.close(taskId, {});
    expect((await shop.reserve(taskId)).status).toBe(409);
    expect((await shop.setAside(taskId, { partId: shop.kit, quantity: 1 })).status).toBe(409);
    const need = { partId: shop.kit, quantity: 1 };
    expect((await shop.mechanic.send('PUT', `/tasks/${taskId}/needs`, need)).status).toBe(409);
  });
});
