import { randomUUID } from 'node:crypto';
import { beforeAll, describe, expect, test } from 'vitest';
import { checkIn } from '@/lib/actions/check-in';
import { recordLayUp } from '@/lib/actions/record-lay-up';
import { reportDefect } from '@/lib/actions/report-defect';
import { expectRefused, recordsOf, unreadable, type Bad } from '../support/bad-input';
import { asSystem, minutesAgo, openDock } from '../support/crew';
import { testDatabase } from '../support/database';
import { testApi, type Caller } from '../support/http';

const database = testDatabase({ keep: true });
const api = testApi(database);
const nobody = '5b0c3f5e-6f0e-4f0a-9a51-0d1f8f2b7a11';
/** Stand for ids that the set-up makes: a unit, dock and model, the same of a dock elsewhere, what was written on the unit. */
const names = [
  'UNIT',
  'DOCK',
  'MODEL',
  'AWAY',
  'AWAY-DOCK',
  'READING',
  'ENTRY',
  'DEFECT',
  'LAY-UP',
  'NEW',
] as const;
const ids = new Map<string, string>();

let manager: Caller;
let hand: Caller;
let mechanic: Caller;

beforeAll(async () => {
  const { db } = database;
  const home = await openDock(db, { now: minutesAgo(600) });
  const away = await openDock(db, { name: 'Cais Sul', fleetNumber: 'S-1', now: minutesAgo(600) });
  const ctx = asSystem(db, minutesAgo(120));
  const unitId = home.unit.id;
  const reading = await checkIn(ctx, { id: randomUUID(), unitId, hours: 100.5 });
  const defect = await reportDefect(ctx, { unitId, title: 'Decal faded', holdsUnit: false });
  const layUp = await recordLayUp(ctx, { unitId: away.unit.id, fromOn: '2027-01-01', reason: 'Winter' });
  const entry = await db
    .selectFrom('reading')
    .select('id')
    .where('source', '=', 'entry')
    .where('unit_id', '=', unitId)
    .executeTakeFirstOrThrow();
  const values = [
    unitId,
    home.dock.id,
    home.model.id,
    away.unit.id,
    away.dock.id,
    reading.id,
    entry.id,
    defect.id,
    layUp.id,
  ];
  names.forEach((name, index) => ids.set(name, values[index] ?? randomUUID()));
  manager = await api.caller('manager');
  mechanic = await api.caller('mechanic', { dockIds: [home.dock.id] });
  hand = await api.caller('dock', { dockIds: [home.dock.id] });
});

/** With the ids that names stand for put in. */
function filled<T>(value: T): T {
  const text = JSON.stringify(value).replace(/@([A-Z-]+)/g, (_, name: string) => ids.get(name) ?? name);
  return JSON.parse(text) as T;
}

const checkInBody = { id: '@NEW', unitId: '@UNIT', hours: 100.6 };
const checkOutBody = { id: '@NEW', unitId: '@UNIT' };
const unitBody = {
  fleetNumber: 'N-9',
  modelId: '@MODEL',
  dockId: '@DOCK',
  enteredServiceOn: '2026-05-01',
  engineHours: 1,
};
const readingBody = checkInBody;
const defectBody = { unitId: '@UNIT', title: 'Seat torn', holdsUnit: true };
const layUpBody = { unitId: '@UNIT', fromOn: '2027-01-01', reason: 'Winter' };

type Case = [field: string, part: Record<string, unknown>, status?: number];

/** Each part breaks the body by one field. */
const parts: Record<string, { method?: string; path: string; body: Record<string, unknown>; cases: Case[] }> =
  {
    'a check-in': {
      path: '/check-ins',
      body: checkInBody,
      cases: [
        ['id', { id: undefined }],
        ['id', { id: 'first' }],
        ['id', { id: '5b0c3f5e-6f0e-4f0a-9a51' }],
        ['id', { id: 7 }],
        ['id', { id: '@ENTRY' }, 409],
        ['unitId', { unitId: undefined }],
        ['unitId', { unitId: 'N-1' }],
        ['unitId', { unitId: nobody }, 404],
        ['hours', { hours: undefined }],
        ['hours', { hours: null }],
        ['hours', { hours: '100.6' }],
        ['hours', { hours: -1 }],
        ['hours', { hours: 100.55 }],
        ['hours', { hours: 1e9 }],
        ['hours', { hours: 100.4 }],
        ['hours', { hours: 110 }],
        ['at', { at: 'yesterday' }],
        ['at', { at: '2026-02-30T10:00:00Z' }],
        ['at', { at: '2026-06-02T10:00:00' }],
        ['at', { at: '2026-06-02' }],
        ['at', { at: '2999-01-01T00:00:00Z' }],
        ['at', { at: '1999-01-01T00:00:00Z' }],
        ['meterSwap', { meterSwap: true }],
        ['meterSwap.newFirst', { meterSwap: { oldFinal: 100.5 } }],
        ['meterSwap.oldFinal', { meterSwap: { oldFinal: -1, newFirst: 0 } }],
        ['meterSwap.oldFinal', { hours: 0, meterSwap: { oldFinal: 100.4, newFirst: 0 } }],
        ['confirmReason', { confirmReason: ' ' }],
        ['confirmReason', { confirmReason: 'x'.repeat(501) }],
        ['defect.title', { defect: { title: '', holdsUnit: true } }],
        ['defect.title', { defect: { title: 'Seat\u0000torn', holdsUnit: true } }],
        ['defect.holdsUnit', { defect: { title: 'Seat torn' } }],
        ['defect.holdsUnit', { defect: { title: 'Seat torn', holdsUnit: 'yes' } }],
        ['defect.detail', { defect: { title: 'Seat torn', holdsUnit: true, detail: 'x'.repeat(2001) } }],
        ['fuel', { fuel: 10 }],
      ],
    },
    'a check-out': {
      path: '/check-outs',
      body: checkOutBody,
      cases: [
        ['id', { id: 'first' }],
        ['unitId', { unitId: 7 }],
        ['unitId', { unitId: nobody }, 404],
        ['dockId', { dockId: 'north' }],
        ['dockId', { dockId: '@AWAY-DOCK' }],
        ['at', { at: '2026-13-01T10:00:00Z' }],
        ['at', { at: '2999-01-01T00:00:00Z' }],
        ['at', { at: '1999-01-01T00:00:00Z' }],
        ['dueBackAt', { dueBackAt: 'noon' }],
        ['dueBackAt', { dueBackAt: '1999-01-01T00:00:00Z' }],
        ['plannedHours', { plannedHours: -1 }],
        ['plannedHours', { plannedHours: '2' }],
        ['renterReference', { renterReference: 'x'.repeat(81) }],
        ['renterReference', { renterReference: 'two\nlines' }],
        ['renter', { renter: 'somebody' }],
      ],
    },
    'a unit': {
      path: '/units',
      body: unitBody,
      cases: [
        ['fleetNumber', { fleetNumber: '' }],
        ['fleetNumber', { fleetNumber: 'n-1' }, 409],
        ['modelId', { modelId: nobody }, 404],
        ['dockId', { dockId: nobody }, 404],
        ['enteredServiceOn', { enteredServiceOn: '2026-02-29' }],
        ['enteredServiceOn', { enteredServiceOn: '1 May' }],
        ['engineHours', { engineHours: -0.1 }],
        ['engineHours', { engineHours: undefined }],
        ['outings', { outings: 1.5 }],
        ['outings', { outings: -1 }],
        ['carbCount', { carbCount: 17 }],
        ['hin', { hin: 'x'.repeat(31) }],
      ],
    },
    'a change of a unit': {
      method: 'PATCH',
      path: '/units/@UNIT',
      body: {},
      cases: [
        ['', {}],
        ['fleetNumber', { fleetNumber: 'S-1' }, 409],
        ['modelId', { modelId: nobody }, 404],
        ['dockId', { dockId: nobody }, 404],
        ['enteredServiceOn', { enteredServiceOn: '2026-02-29' }],
        ['carbCount', { carbCount: -1 }],
        ['retired', { retired: false }],
        ['engineHours', { engineHours: 5 }],
      ],
    },
    'a reading': {
      path: '/readings',
      body: readingBody,
      cases: [
        ['id', { id: '@READING' }, 409],
        ['unitId', { unitId: nobody }, 404],
        ['hours', { hours: 100.4 }],
        ['hours', { hours: Number.MAX_SAFE_INTEGER }],
        ['at', { at: '2026-02-30T10:00:00Z' }],
        ['defect', { defect: { title: 'Seat torn', holdsUnit: true } }],
      ],
    },
    'the voiding of a reading': {
      path: '/readings/@READING/voiding',
      body: { reason: 'Misread' },
      cases: [
        ['reason', { reason: undefined }],
        ['reason', { reason: ' ' }],
        ['replacement.hours', { replacement: { hours: 99 } }],
        ['replacement.hours', { replacement: {} }],
        ['replacement.hours', { replacement: { hours: -5 } }],
        ['outingHappened', { outingHappened: 'no' }],
      ],
    },
    'the review of a reading': {
      path: '/readings/@READING/review',
      body: {},
      cases: [
        ['id', {}, 409],
        ['note', { note: 5 }],
      ],
    },
    'a defect': {
      path: '/defects',
      body: defectBody,
      cases: [
        ['id', { id: 'x' }],
        ['unitId', { unitId: nobody }, 404],
        ['title', { title: '  ' }],
        ['detail', { detail: 5 }],
        ['holdsUnit', { holdsUnit: undefined }],
      ],
    },
    'the clearance of a defect': {
      path: '/defects/@DEFECT/clearance',
      body: { note: 'Gone' },
      cases: [
        ['note', { note: '' }],
        ['note', { note: undefined }],
      ],
    },
    'a lay-up': {
      path: '/lay-ups',
      body: layUpBody,
      cases: [
        ['unitId', { unitId: '@AWAY' }, 409],
        ['fromOn', { fromOn: '2027-02-29' }],
        ['untilOn', { untilOn: '2026-12-31' }],
        ['untilOn', { untilOn: '2027-11-31' }],
        ['reason', { reason: undefined }],
      ],
    },
  };

const table = Object.entries(parts).flatMap(([what, { method = 'POST', path, body, cases }]) =>
  cases.map(([field, part, status = 422]) => ({
    what,
    field,
    part,
    bad: { method, path, body: { ...body, ...part }, status, field } satisfies Bad,
  })),
);

test.each(table)('$what with $part is refused by $field and changes nothing', async ({ bad }) => {
  await expectRefused(database.db, manager, filled<Bad>(bad));
});

const bodies = Object.values(parts).map(({ method = 'POST', path }) => [method, path] as const);
test.each(bodies)('%s %s refuses a body that nobody can read', async (method, path) => {
  for (const bad of unreadable(method, filled(path))) await expectRefused(database.db, manager, bad);
});

const questions: [path: string, field: string, status?: number][] = [
  ['/availability?dockId=north', 'dockId'],
  [`/availability?dockId=${nobody}`, 'dockId', 404],
  [`/tasks?dockId=${nobody}`, 'dockId', 404],
  [`/units?dockId=${nobody}`, 'dockId', 404],
  [`/calendar?from=2026-06-01&to=2026-06-30&dockId=${nobody}`, 'dockId', 404],
  ['/availability?on=2026-02-29', 'on'],
  ['/availability?hours=-1', 'hours'],
  ['/availability?hours=two', 'hours'],
  ['/readings', 'unitId'],
  [`/readings?unitId=${nobody}`, 'unitId', 404],
  ['/readings?review=all', 'review'],
  ['/readings?review=open&cursor=x', 'cursor'],
  [`/readings?review=open&cursor=2026-06-02T11:00:00.000Z_${nobody}`, 'cursor'],
  ['/readings?review=open&limit=0', 'limit'],
  ['/defects?open=maybe', 'open'],
  ['/defects?unitId=x', 'unitId'],
  [`/lay-ups?unitId=${nobody}`, 'unitId', 404],
  ['/units/x', 'id'],
  [`/units/${nobody}`, 'id', 404],
];
test.each(questions)('GET %s is refused by %s', async (path, field, status = 422) => {
  await expectRefused(database.db, manager, { method: 'GET', path, status, field });
});

test.each([
  ['/readings', 'voiding', { reason: 'Misread' }],
  ['/readings', 'review', {}],
  ['/defects', 'clearance', { note: 'Gone' }],
  ['/lay-ups', 'ending', {}],
])('%s of an id that is none, or nobody’s, is refused by it', async (noun, verb, body) => {
  const bad = { method: 'POST', body, field: 'id' };
  await expectRefused(database.db, manager, { ...bad, path: `${noun}/none/${verb}`, status: 422 });
  await expectRefused(database.db, manager, { ...bad, path: `${noun}/${nobody}/${verb}`, status: 404 });
});

describe('somebody else’s dock', () => {
  const away: Bad[] = [
    {
      method: 'POST',
      path: '/check-ins',
      body: { ...checkInBody, unitId: '@AWAY' },
      status: 403,
      field: 'unitId',
    },
    {
      method: 'POST',
      path: '/check-outs',
      body: { ...checkOutBody, unitId: '@AWAY' },
      status: 403,
      field: 'unitId',
    },
    {
      method: 'POST',
      path: '/readings',
      body: { ...readingBody, unitId: '@AWAY' },
      status: 403,
      field: 'unitId',
    },
    {
      method: 'POST',
      path: '/defects',
      body: { ...defectBody, unitId: '@AWAY' },
      status: 403,
      field: 'unitId',
    },
    {
      method: 'POST',
      path: '/lay-ups',
      body: { ...layUpBody, unitId: '@AWAY' },
      status: 403,
      field: 'unitId',
    },
    { method: 'POST', path: '/lay-ups/@LAY-UP/ending', status: 403 },
    { method: 'GET', path: '/units/@AWAY', status: 403 },
    { method: 'GET', path: '/availability?dockId=@AWAY-DOCK', status: 403, field: 'dockId' },
    { method: 'GET', path: '/tasks?dockId=@AWAY-DOCK', status: 403, field: 'dockId' },
    { method: 'GET', path: '/units?dockId=@AWAY-DOCK', status: 403, field: 'dockId' },
    {
      method: 'GET',
      path: '/calendar?from=2026-06-01&to=2026-06-30&dockId=@AWAY-DOCK',
      status: 403,
      field: 'dockId',
    },
  ];
  test.each(away)('$method $path is forbidden there', async (bad) => {
    await expectRefused(database.db, mechanic, filled(bad));
  });

  test('does not show in lists', async () => {
    const shown = (
      await mechanic.send<{ held: { unitId: string }[]; ready: { unitId: string }[] }>('GET', '/availability')
    ).body;
    expect([...shown.held, ...shown.ready].map(({ unitId }) => unitId)).toEqual([ids.get('UNIT')]);
    expect((await mechanic.send('GET', '/lay-ups')).body).toEqual({ items: [], nextCursor: null });
  });
});

test.each([
  { method: 'POST', path: '/readings/@READING/voiding', body: { reason: 'Misread' }, status: 403 },
  { method: 'POST', path: '/readings/@READING/review', body: {}, status: 403 },
  { method: 'POST', path: '/defects/@DEFECT/clearance', body: { note: 'Gone' }, status: 403 },
  { method: 'POST', path: '/lay-ups', body: layUpBody, status: 403 },
  { method: 'POST', path: '/units', body: unitBody, status: 403 },
  { method: 'PATCH', path: '/units/@UNIT', body: { fleetNumber: 'N-2' }, status: 403 },
  { method: 'GET', path: '/readings?review=open', status: 403 },
])('a dock hand may not $method $path', async (bad) => {
  await expectRefused(database.db, hand, filled<Bad>(bad));
});

test('an id in capitals is the same id', async () => {
  const sent = filled({ ...checkInBody, id: randomUUID(), hours: 100.6 });
  const first = await hand.send('POST', '/check-ins', sent);
  expect(first.status, JSON.stringify(first.body)).toBe(201);
  const before = await recordsOf(database.db);
  const again = { ...sent, id: sent.id.toUpperCase(), unitId: sent.unitId.toUpperCase() };
  expect((await hand.send('POST', '/check-ins', again)).body).toEqual(first.body);
  expect(await recordsOf(database.db)).toEqual(before);
});
