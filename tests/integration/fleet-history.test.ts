import { randomUUID } from 'node:crypto';
import { beforeEach, expect, test } from 'vitest';
import { historyEntry, type HistoryEntry } from '@/lib/schemas/history';
import { minutesAgo, openDock } from '../support/crew';
import { testDatabase } from '../support/database';
import { testApi, type Caller } from '../support/http';

const database = testDatabase();
const api = testApi(database);

let mechanic: Caller;
let dock: Awaited<ReturnType<typeof openDock>>;

type Page = { items: HistoryEntry[]; nextCursor: string | null };

beforeEach(async () => {
  dock = await openDock(database.db);
  mechanic = await api.caller('mechanic');
});

async function post(path: string, body: object) {
  const answer = await mechanic.send('POST', path, body);
  expect(answer.status, JSON.stringify(answer.body)).toBe(201);
  return answer.body;
}

const history = async (query = '') => {
  const { status, body } = await mechanic.send<Page>('GET', `/units/${dock.unit.id}/history${query}`);
  expect(status, JSON.stringify(body)).toBe(200);
  for (const item of body.items) historyEntry.parse(item);
  return body;
};

/** An outing with its reading, a mistaken reading voided, a meter swap, a defect, a lay-up and a repair. */
async function aBusyMonth() {
  const unitId = dock.unit.id;
  const outing = randomUUID();
  await post('/check-outs', { id: outing, unitId, at: minutesAgo(300).toISOString() });
  const back = randomUUID();
  await post('/check-ins', { id: back, unitId, hours: 101.5, at: minutesAgo(200).toISOString() });
  const mistake = randomUUID();
  await post('/readings', { id: mistake, unitId, hours: 102, at: minutesAgo(150).toISOString() });
  await post(`/readings/${mistake}/voiding`, { reason: 'Read the wrong craft.' });
  await post('/readings', {
    id: randomUUID(),
    unitId,
    hours: 0.4,
    at: minutesAgo(60).toISOString(),
    meterSwap: { oldFinal: 102.2, newFirst: 0 },
  });
  await post('/defects', { unitId, title: 'Cracked hatch', holdsUnit: true });
  await post('/lay-ups', { unitId, fromOn: '2027-11-01', reason: 'Winter' });
  return { outing, back, mistake };
}

test('a unit’s history is one list, the latest first, with what was voided and why', async () => {
  const { outing, back, mistake } = await aBusyMonth();
  const { items, nextCursor } = await history();
  expect(nextCursor).toBeNull();
  expect(items.map(({ kind }) => kind)).toEqual([
    'lay_up',
    'defect',
    'reading',
    'meter_swap',
    'reading',
    'outing',
    'reading',
  ]);
  expect(items[2]).toMatchObject({ source: 'logged', shownHours: 0.4, engineHours: 102.6 });
  expect(items[3]).toMatchObject({ oldFinal: 102.2, newFirst: 0, engineHours: 102.2 });
  expect(items[4]).toMatchObject({ id: mistake, voidReason: 'Read the wrong craft.', voidedBy: 'mechanic' });
  expect(items[5]).toMatchObject({
    id: outing,
    readingId: back,
    engineHours: 101.5,
    checkedInBy: 'mechanic',
  });
  expect(items[6]).toMatchObject({ source: 'entry', engineHours: 100 });
});

test('asked for readings alone, it shows those that outings came back with too', async () => {
  const { back, mistake } = await aBusyMonth();
  const { items } = await history('?kind=reading');
  expect(items.map(({ kind }) => kind)).toEqual(['reading', 'reading', 'reading', 'reading']);
  expect(items.slice(1, 3).map(({ id }) => id)).toEqual([mistake, back]);
});

test('its pages follow on each other without a gap or a repeat', async () => {
  await aBusyMonth();
  const whole = (await history()).items.map(({ id }) => id);
  const paged: string[] = [];
  let cursor: string | null = '';
  while (cursor !== null) {
    const page: Page = await history(`?limit=2${cursor && `&cursor=${cursor}`}`);
    paged.push(...page.items.map(({ id }) => id));
    cursor = page.nextCursor;
  }
  expect(paged).toEqual(whole);
});

test('a cursor of one’s own making is refused', async () => {
  const { status, body } = await mechanic.send('GET', `/units/${dock.unit.id}/history?cursor=elsewhere`);
  expect(status).toBe(422);
  expect(body.errors).toEqual([{ path: 'cursor', message: 'is none that a list answered' }]);
});

test('somebody of another dock does not see it', async () => {
  const far = await openDock(database.db, { name: 'Cais Sul', fleetNumber: 'S-1' });
  const stranger = await api.caller('mechanic', { dockIds: [far.dock.id] });
  expect((await stranger.send('GET', `/units/${dock.unit.id}/history`)).status).toBe(403);
});
