import { randomUUID } from 'node:crypto';
import { beforeEach, describe, expect, test } from 'vitest';
import type { PartLine, Part } from '@/lib/schemas/part';
import type { RecordedMoves, StockLine } from '@/lib/schemas/stock';
import { expectRefused } from '../support/bad-input';
import { testDatabase } from '../support/database';
import { testApi, type Caller } from '../support/http';
import { openStock, stockUp } from '../support/stock';

const database = testDatabase();
const api = testApi(database);

let manager: Caller;
let north: string;
let south: string;
let gasket: string;
let needle: string;
let kit: string;

beforeEach(async () => {
  ({ north, south, gasket, needle, kit } = await openStock(database.db));
  manager = await api.caller('manager', { name: 'Ines Marlow' });
});

const move = (kind: string, partId: string, quantity: number, more: object = {}) => ({
  ...{ id: randomUUID(), kind, partId, dockId: north, quantity },
  ...more,
});
const record = (body: object, by: Caller = manager) => by.send<RecordedMoves>('POST', '/stock-moves', body);
const partOf = async (id: string) => (await manager.send<Part>('GET', `/parts/${id}`)).body;
const itemsOf = async <T>(path: string) =>
  (await manager.send<{ items: T[]; nextCursor: string | null }>('GET', path)).body;

describe('a part', () => {
  const stock = (name: string, more: object = {}) => ({ id: randomUUID(), number: name, name, ...more });
  const create = (body: object, by: Caller = manager) => by.send<Part>('POST', '/parts', body);

  test('is added, changed and retired; the same id again answers alike', async () => {
    const body = stock('Impeller ring', { supplier: 'The chandler' });
    const first = await create(body);
    expect(first).toMatchObject({ status: 201, body: { name: 'Impeller ring', isKit: false, levels: [] } });
    expect(await create(body)).toEqual(first);
    const path = `/parts/${body.id}`;
    await manager.send('PATCH', path, { supplier: null, number: 'R-7' });
    expect(await partOf(body.id)).toMatchObject({ number: 'R-7', supplier: null, name: 'Impeller ring' });
    expect((await manager.send('POST', `${path}/retirement`)).status).toBe(200);
    expect((await itemsOf<PartLine>('/parts')).items.map(({ id }) => id)).not.toContain(body.id);
    expect((await itemsOf<PartLine>('/parts?retired=true')).items.map(({ id }) => id)).toContain(body.id);
    expect((await manager.send('PATCH', path, { name: 'New' })).status).toBe(409);
    expect((await record(move('receive', body.id, 1))).status).toBe(409);
  });

  test('keeps its number for itself, in any case of letters', async () => {
    const refused = await create(stock('gasket'));
    expect(refused).toMatchObject({ status: 409, body: { errors: [{ path: 'number' }] } });
    const renamed = await manager.send('PATCH', `/parts/${needle}`, { number: 'gaskET' });
    expect(renamed).toMatchObject({ status: 409, body: { errors: [{ path: 'number' }] } });
  });

  test('that something needs or that is on a shelf is not retired', async () => {
    const retire = (id: string) => manager.send('POST', `/parts/${id}/retirement`);
    expect((await retire(gasket)).body).toMatchObject({ detail: 'is used by “Carburettor kit”' });
    await stockUp(database.db, { partId: kit, dockId: north, quantity: 1 });
    expect((await retire(kit)).body).toMatchObject({ detail: expect.stringContaining('1 at Cais Norte') });
    await record(move('count', kit, 0));
    expect((await retire(kit)).status).toBe(200);
    expect((await retire(kit)).status).toBe(409);
    expect((await retire(gasket)).status).toBe(200);
  });

  test.each([
    ['contents.0.partId', 'nothing', () => [{ partId: randomUUID(), quantity: 1 }]],
    ['contents.0.partId', 'a kit', () => [{ partId: kit, quantity: 1 }]],
    [
      'contents.1.partId',
      'the same twice',
      () => [gasket, gasket].map((partId) => ({ partId, quantity: 1 })),
    ],
    ['contents.0.quantity', 'none of it', () => [{ partId: gasket, quantity: 0 }]],
  ])('that is a kit does not hold %s: %s', async (field, _, contents) => {
    const body = stock('Kit', { contents: contents() });
    await expectRefused(database.db, manager, { method: 'POST', path: '/parts', body, status: 422, field });
  });

  test('that is no kit holds nothing, and a kit holds what it is changed to', async () => {
    const contents = [{ partId: needle, quantity: 2 }];
    const path = `/parts/${gasket}`;
    await expectRefused(database.db, manager, {
      ...{ method: 'PATCH', path, body: { contents }, status: 422, field: 'contents' },
    });
    await manager.send('PATCH', `/parts/${kit}`, { contents });
    expect((await partOf(kit)).contents).toMatchObject([{ name: 'Needle', quantity: 2 }]);
    expect((await partOf(gasket)).inKits).toEqual([]);
    expect((await partOf(needle)).inKits).toMatchObject([{ name: 'Carburettor kit', quantity: 2 }]);
  });

  test('is written by managers and mechanics of all docks, and read by everybody', async () => {
    const callers = {
      mechanic: await api.caller('mechanic'),
      hand: await api.caller('dock'),
      far: await api.caller('manager', { dockIds: [south] }),
    };
    expect((await create(stock('A'), callers.mechanic)).status).toBe(201);
    expect((await create(stock('B'), callers.hand)).status).toBe(403);
    expect((await create(stock('C'), callers.far)).status).toBe(403);
    expect((await callers.hand.send('GET', `/parts/${kit}`)).status).toBe(200);
    expect((await callers.far.send('POST', `/parts/${kit}/retirement`)).status).toBe(403);
  });

  test('is low from its mark on, stands first then, and no more once it is stocked up', async () => {
    const mark = (lowAt: number | null) =>
      manager.send<Part>('PUT', `/parts/${needle}/low-mark`, { dockId: north, lowAt });
    await stockUp(database.db, { partId: needle, dockId: north, quantity: 3 });
    expect((await mark(2)).body.low).toBe(false);
    await record(move('count', needle, 2));
    const { items } = await itemsOf<PartLine>('/parts');
    expect(items.map(({ name, low }) => [name, low])).toEqual([
      ['Needle', true],
      ['Carburettor kit', false],
      ['Gasket', false],
    ]);
    expect((await itemsOf<PartLine>('/parts?low=true')).items).toHaveLength(1);
    expect((await itemsOf<StockLine>('/stock?low=true')).items).toMatchObject([
      { name: 'Needle', dockName: 'Cais Norte', onHand: 2, free: 2, lowAt: 2 },
    ]);
    expect((await itemsOf<PartLine>(`/parts?low=true&dockId=${south}`)).items).toEqual([]);
    await record(move('receive', needle, 1));
    expect((await itemsOf<PartLine>('/parts?low=true')).items).toEqual([]);
    expect((await mark(null)).body.levels).toMatchObject([{ lowAt: null }]);
  });

  test('stands in pages, low ones first', async () => {
    const names: string[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const page: { items: PartLine[]; nextCursor: string | null } = await itemsOf<PartLine>(
        `/parts?limit=1${cursor && `&cursor=${cursor}`}`,
      );
      names.push(...page.items.map(({ name }) => name));
      cursor = page.nextCursor;
    }
    expect(names).toEqual(['Carburettor kit', 'Gasket', 'Needle']);
    expect((await manager.send('GET', '/parts?cursor=nonsense')).status).toBe(422);
  });
});
