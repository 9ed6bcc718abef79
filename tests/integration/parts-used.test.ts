import { randomUUID } from 'node:crypto';
import { beforeEach, describe, expect, test } from 'vitest';
import type { PartNeed } from '@/lib/domain/rule';
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

const used = (partId: string, quantity: number, more: object = {}) => ({ partId, quantity, ...more });
const codeOf = ({ body }: { body: unknown }) => (body as { code?: string }).code;

describe('closing', () => {
  test('takes out what was used, as moves of the closure, and keeps it with the closure', async () => {
    await shop.stock(shop.kit, 3);
    await shop.stock(shop.plug, 1, shop.south);
    const taskId = await shop.taskOf(shop.perCarb);
    await shop.reserve(taskId);
    const partsUsed = [used(shop.kit, 2), used(shop.plug, 1, { dockId: shop.south })];
    const closed = await shop.close(taskId, { partsUsed });
    expect(closed.status, JSON.stringify(closed.body)).toBe(201);
    expect(closed.body.partsUsed).toMatchObject([
      { name: 'Carburettor kit', quantity: 2, dockName: 'Cais Norte', reason: null },
      { name: 'Plug', quantity: 1, dockName: 'Cais Sul' },
    ]);
    expect(await shop.shelves()).toEqual({ 'Carburettor kit at Cais Norte': 1, 'Plug at Cais Sul': 0 });
    const ledger = await shop.manager.send<{ items: object[] }>('GET', `/stock-moves?taskId=${taskId}`);
    expect(ledger.body.items).toMatchObject([
      { kind: 'taken', quantity: -1, closureId: closed.body.id, task: { fleetNumber: 'N-1' } },
      { kind: 'taken', quantity: -2, movedBy: { name: 'mechanic' } },
    ]);
    const { body } = await shop.manager.send<{ levels: object[] }>('GET', `/parts/${shop.kit}`);
    expect(body.levels).toMatchObject([{ onHand: 1, reserved: 0 }]);
  });

  test('that is reversed puts them back, once', async () => {
    await shop.stock(shop.kit, 2);
    const taskId = await shop.repair();
    const { id } = (await shop.close(taskId, { partsUsed: [used(shop.kit, 2)] })).body;
    const reverse = () => shop.manager.send('POST', `/closures/${id}/reversal`, { reason: 'Another craft' });
    const answers = await Promise.all([reverse(), reverse()]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    expect(await shop.shelves()).toEqual({ 'Carburettor kit at Cais Norte': 2 });
    const { body } = await shop.manager.send<{ items: object[] }>('GET', `/stock-moves?taskId=${taskId}`);
    expect(body.items[0]).toMatchObject({
      kind: 'put_back',
      quantity: 2,
      reason: 'Another craft',
      closureId: id,
    });
    await shop.close(taskId, { partsUsed: [used(shop.kit, 1)] });
    expect(await shop.shelves()).toEqual({ 'Carburettor kit at Cais Norte': 1 });
  });

  test('with more than there is asks why and closes nothing; with a reason it owes a count', async () => {
    await shop.stock(shop.kit, 1);
    const taskId = await shop.repair();
    const path = `/tasks/${taskId}/closure`;
    await expectRefused(database.db, shop.mechanic, {
      ...{ method: 'POST', path, body: { partsUsed: [used(shop.kit, 2)] } },
      ...{ status: 422, field: 'partsUsed.0.reason', code: 'reason_needed' },
    });
    const twice = { partsUsed: [used(shop.kit, 1), used(shop.kit, 1)] };
    await expectRefused(database.db, shop.mechanic, {
      ...{ method: 'POST', path, body: twice, status: 422, field: 'partsUsed.1.reason' },
    });
    const partsUsed = [used(shop.kit, 2, { reason: 'Found one in the drawer' })];
    expect((await shop.close(taskId, { partsUsed })).body.partsUsed).toMatchObject([
      { reason: 'Found one in the drawer' },
    ]);
    expect(await shop.shelves()).toEqual({ 'Carburettor kit at Cais Norte': -1 });
  });

  test('asks why before it takes what is set aside for other work', async () => {
    await shop.stock(shop.kit, 2);
    await shop.reserve(await shop.taskOf(shop.perCarb));
    const taskId = await shop.repair();
    const refused = await shop.close(taskId, { partsUsed: [used(shop.kit, 1)] });
    expect(refused).toMatchObject({ status: 422, body: { errors: [{ path: 'partsUsed.0.reason' }] } });
  });

  test('races another for the last kit: one of them is told so', async () => {
    await shop.stock(shop.kit, 1);
    const other = await openUnitElsewhere();
    const tasks = [await shop.repair(), other];
    const answers = await Promise.all(
      tasks.map((id) => shop.close(id, { partsUsed: [used(shop.kit, 1, { dockId: shop.home.dock.id })] })),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 422]);
    const loser = answers.find(({ status }) => status === 422)!;
    expect([codeOf(loser), loser.body]).toMatchObject([
      'reason_needed',
      { detail: 'Carburettor kit: none on hand: say why it was taken all the same' },
    ]);
    expect(await shop.shelves()).toEqual({ 'Carburettor kit at Cais Norte': 0 });
    expect(await database.db.selectFrom('closure').selectAll().execute()).toHaveLength(1);
  });

  test.each([
    ['partsUsed.0.partId', () => [used(randomUUID(), 1)], 404],
    ['partsUsed.0.partId', () => [{ quantity: 1 }], 422],
    ['partsUsed.0.quantity', () => [used(shop.kit, 0)], 422],
    ['partsUsed.0.quantity', () => [used(shop.kit, 0.5)], 422],
    ['partsUsed.1.dockId', () => [used(shop.kit, 1), used(shop.kit, 1, { dockId: randomUUID() })], 404],
    ['partsUsed.0.reason', () => [used(shop.kit, 1, { reason: 5 })], 422],
  ])('with a wrong %s is refused by name and closes nothing', async (field, partsUsed, status) => {
    await shop.stock(shop.kit, 5);
    const taskId = await shop.repair();
    await expectRefused(database.db, shop.mechanic, {
      ...{
        method: 'POST',
        path: `/tasks/${taskId}/closure`,
        body: { partsUsed: partsUsed() },
        status,
        field,
      },
    });
  });

  /** A shop.repair of another unit, so that nothing but the shelf is shared. */
  async function openUnitElsewhere(): Promise<string> {
    const unit = await shop.manager.send<{ id: string }>('POST', '/units', {
      ...{ fleetNumber: 'N-2', modelId: shop.home.model.id, dockId: shop.home.dock.id },
      ...{ enteredServiceOn: '2026-05-01', engineHours: 5 },
    });
    return shop.open({ unitId: unit.body.id, kind: 'repair', title: 'Torn seat' });
  }
});

test('a rule names parts in use, and says which of its lines names none', async () => {
  const retired = (await addPart(database.db, 'Old plug')).id;
  await shop.manager.send('POST', `/parts/${retired}/retirement`);
  const rule = (parts: PartNeed[]) => ({
    ...{ name: 'Plugs', kind: 'service', appliesTo: {}, parts },
    triggers: [{ on: 'engine_hours', every: 50 }],
  });
  const line = (partId: string, quantity = 1): PartNeed => ({ partId, quantity, per: 'cylinder' });
  const right = await shop.manager.send<{ id: string }>('POST', '/rules', rule([line(shop.plug)]));
  expect(right).toMatchObject({ status: 201, body: { parts: [line(shop.plug)] } });
  const { body } = await shop.manager.send<{ rules: object[] }>('GET', `/parts/${shop.plug}`);
  expect(body.rules).toEqual([{ id: right.body.id, name: 'Plugs', quantity: 1, per: 'cylinder' }]);
  for (const [partId, quantity, field] of [
    [retired, 1, 'parts.1.partId'],
    [randomUUID(), 1, 'parts.1.partId'],
    [shop.kit, 0.5, 'parts.1.quantity'],
  ] as const)
    await expectRefused(database.db, shop.manager, {
      ...{ method: 'POST', path: '/rules', body: rule([line(shop.plug), line(partId, quantity)]) },
      ...{ status: 422, field },
    });
});
