import { randomUUID } from 'node:crypto';
import { beforeEach, describe, expect, test } from 'vitest';
import type { RecordedMoves, StockLine, StockMove } from '@/lib/schemas/stock';
import { expectRefused } from '../support/bad-input';
import { testDatabase } from '../support/database';
import { testApi, type Caller } from '../support/http';
import { onShelves, openStock, stockUp } from '../support/stock';

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
const codeOf = ({ body }: { body: unknown }) => (body as { code?: string }).code;
const shelves = () => onShelves(database.db);
const itemsOf = async <T>(path: string) =>
  (await manager.send<{ items: T[]; nextCursor: string | null }>('GET', path)).body;

describe('stock', () => {
  test('that is received stands on the shelf, with who brought it and when', async () => {
    const answer = await record(move('receive', gasket, 12, { reason: 'Order 7' }));
    expect(answer.status).toBe(201);
    expect(answer.body.moves).toMatchObject([
      {
        ...{ kind: 'received', partName: 'Gasket', dockName: 'Cais Norte', quantity: 12, balance: 12 },
        ...{ reason: 'Order 7', movedBy: { name: 'Ines Marlow' }, task: null },
      },
    ]);
    expect(await shelves()).toEqual({ 'Gasket at Cais Norte': 12 });
  });

  test('that is counted stands at what was counted, and the ledger says by how much it was off', async () => {
    await record(move('receive', gasket, 12));
    expect((await record(move('count', gasket, 9))).body.moves).toMatchObject([
      { kind: 'counted', quantity: -3, balance: 9 },
    ]);
    expect((await record(move('count', gasket, 9))).body.moves).toMatchObject([{ quantity: 0, balance: 9 }]);
    expect((await record(move('count', needle, 0))).body.moves).toMatchObject([{ quantity: 0, balance: 0 }]);
  });

  test('moves between docks in one go, and never further than there is without a reason', async () => {
    await record(move('receive', gasket, 5));
    const moved = await record(move('move', gasket, 4, { toDockId: south }));
    expect(moved.body.moves).toMatchObject([
      { kind: 'moved_out', quantity: -4, balance: 1, dockName: 'Cais Norte' },
      { kind: 'moved_in', quantity: 4, balance: 4, dockName: 'Cais Sul' },
    ]);
    const further = move('move', gasket, 2, { toDockId: south });
    const refused = { method: 'POST', path: '/stock-moves', status: 422, code: 'reason_needed' };
    await expectRefused(database.db, manager, { ...refused, body: further, field: 'reason' });
    expect((await record({ ...further, reason: 'Counted wrong' })).status).toBe(201);
    expect(await shelves()).toEqual({ 'Gasket at Cais Norte': -1, 'Gasket at Cais Sul': 6 });
  });

  test('makes up a kit of its parts, and a kit breaks up into them', async () => {
    await record(move('receive', gasket, 7));
    await record(move('receive', needle, 2));
    expect((await record(move('make_up', kit, 2))).body.moves).toMatchObject([
      { partName: 'Carburettor kit', kind: 'made_up', quantity: 2 },
      { partName: 'Gasket', kind: 'made_up', quantity: -6, balance: 1 },
      { partName: 'Needle', kind: 'made_up', quantity: -2, balance: 0 },
    ]);
    await record(move('break_up', kit, 1));
    expect(await shelves()).toEqual({
      'Carburettor kit at Cais Norte': 1,
      'Gasket at Cais Norte': 4,
      'Needle at Cais Norte': 1,
    });
  });

  test('of a part that a kit wants and that is short is named, and no kit is made up', async () => {
    await record(move('receive', gasket, 7));
    const body = move('make_up', kit, 1);
    await expectRefused(database.db, manager, {
      ...{ method: 'POST', path: '/stock-moves', body },
      ...{ status: 422, field: 'reason', code: 'reason_needed' },
    });
    expect((await record(body)).body).toMatchObject({
      detail: expect.stringContaining('Needle: none on hand'),
    });
  });

  test('is recorded once, however often the same id is sent', async () => {
    const body = move('receive', gasket, 5);
    const first = await record(body);
    const [again, both] = await Promise.all([record(body), record(body)]);
    expect([again, both]).toEqual([first, first]);
    const swap = move('move', gasket, 1, { toDockId: south });
    await Promise.all([record(swap), record(swap), record(swap)]);
    expect(await shelves()).toEqual({ 'Gasket at Cais Norte': 4, 'Gasket at Cais Sul': 1 });
    const other = await record({ ...body, partId: needle });
    expect([other.status, codeOf(other)]).toEqual([409, 'conflict']);
  });

  test('that two people take at once is not taken twice', async () => {
    await record(move('receive', gasket, 1));
    const takes = [1, 2, 3, 4].map(() => record(move('move', gasket, 1, { toDockId: south })));
    const statuses = (await Promise.all(takes)).map(({ status }) => status);
    expect(statuses.sort()).toEqual([201, 422, 422, 422]);
    expect(await shelves()).toEqual({ 'Gasket at Cais Norte': 0, 'Gasket at Cais Sul': 1 });
  });

  test('counted by two at once ends at what one of them counted', async () => {
    await record(move('receive', gasket, 20));
    await Promise.all([record(move('count', gasket, 8)), record(move('count', gasket, 8))]);
    expect(await shelves()).toEqual({ 'Gasket at Cais Norte': 8 });
  });

  test('is the business of those who work at its dock: dock hands only look', async () => {
    const hand = await api.caller('dock');
    const far = await api.caller('mechanic', { dockIds: [south] });
    await stockUp(database.db, { partId: gasket, dockId: north, quantity: 3 });
    expect((await record(move('receive', gasket, 1), hand)).status).toBe(403);
    expect((await record(move('receive', gasket, 1), far)).status).toBe(403);
    expect((await record(move('receive', gasket, 1, { dockId: south, id: randomUUID() }), far)).status).toBe(
      201,
    );
    const push = move('move', gasket, 1, { dockId: south, toDockId: north });
    expect((await record(push, far)).body).toMatchObject({ errors: [{ path: 'toDockId' }] });
    const seen = await far.send<{ items: StockLine[] }>('GET', '/stock');
    expect(seen.body.items.map(({ dockName }) => dockName)).toEqual(['Cais Sul']);
    const ledger = await far.send<{ items: StockMove[] }>('GET', '/stock-moves');
    expect(ledger.body.items.map(({ dockName }) => dockName)).toEqual(['Cais Sul']);
    expect((await far.send('GET', `/stock?dockId=${north}`)).status).toBe(403);
  });

  test.each([
    ['quantity', { kind: 'receive', quantity: 0 }, 422],
    ['quantity', { kind: 'count', quantity: -1 }, 422],
    ['quantity', { kind: 'receive', quantity: 1.5 }, 422],
    ['toDockId', { kind: 'move', quantity: 1 }, 422],
    ['toDockId', { kind: 'receive', quantity: 1, toDockId: randomUUID() }, 422],
    ['toDockId', { kind: 'move', quantity: 1, toDockId: randomUUID() }, 404],
    ['partId', { kind: 'make_up', quantity: 1 }, 422],
    ['partId', { kind: 'receive', quantity: 1, partId: randomUUID() }, 404],
    ['dockId', { kind: 'receive', quantity: 1, dockId: randomUUID() }, 404],
    ['kind', { kind: 'lend', quantity: 1 }, 422],
    ['reason', { kind: 'receive', quantity: 1, reason: '' }, 422],
  ])('with a wrong %s is refused by name and moves nothing (%j)', async (field, fields, status) => {
    const body = { ...move('receive', gasket, 1), ...fields };
    await expectRefused(database.db, manager, { method: 'POST', path: '/stock-moves', body, status, field });
  });

  test('is paged in the ledger, the latest first', async () => {
    for (const quantity of [1, 2, 3, 4, 5]) await record(move('receive', gasket, quantity));
    const pages: number[][] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const page: { items: StockMove[]; nextCursor: string | null } = await itemsOf<StockMove>(
        `/stock-moves?partId=${gasket}&limit=2${cursor && `&cursor=${cursor}`}`,
      );
      pages.push(page.items.map(({ balance }) => balance));
      cursor = page.nextCursor;
    }
    expect(pages).toEqual([[15, 10], [6, 3], [1]]);
  });
});
