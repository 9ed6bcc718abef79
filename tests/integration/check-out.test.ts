import { randomUUID } from 'node:crypto';
import { beforeEach, describe, expect, test } from 'vitest';
import { checkIn } from '@/lib/actions/check-in';
import { checkOut } from '@/lib/actions/check-out';
import { changeUnit } from '@/lib/actions/change-unit';
import { recordLayUp } from '@/lib/actions/record-lay-up';
import { reportDefect } from '@/lib/actions/report-defect';
import type { CreateCheckOut } from '@/lib/schemas/check-out';
import { recordsOf } from '../support/bad-input';
import { asSystem, openDock } from '../support/crew';
import { testDatabase } from '../support/database';

const database = testDatabase();
let unitId: string;
let dockId: string;

const at = (time: string) => asSystem(database.db, `2026-06-02T${time}:00Z`);
const out = (time: string, entry: Partial<CreateCheckOut> = {}) =>
  checkOut(at(time), { id: randomUUID(), unitId, ...entry });
const back = (time: string, hours: number) => checkIn(at(time), { id: randomUUID(), unitId, hours });

/** What it is refused with, after making sure that nothing was written. */
async function refusal(attempt: () => Promise<unknown>) {
  const before = await recordsOf(database.db);
  const error: unknown = await attempt().then(
    () => 'was not refused',
    (thrown: unknown) => thrown,
  );
  expect(await recordsOf(database.db)).toEqual(before);
  return error as { code: string; message: string; errors: { path: string; message: string }[] };
}

beforeEach(async () => {
  // Held from 102.0 h on; the unit has 100.0 h.
  const opened = await openDock(database.db, { holdsAt: 102 });
  [unitId, dockId] = [opened.unit.id, opened.dock.id];
});

test('a ready unit goes out, with what was said of the hire', async () => {
  const dueBackAt = new Date('2026-06-02T12:00:00Z');
  const answer = await out('10:00', { plannedHours: 1.5, dueBackAt, renterReference: 'Hire 4711' });
  expect(answer).toMatchObject({ unitId, dockId, at: '2026-06-02T10:00:00.000Z', plannedHours: 1.5 });
  expect(answer).toMatchObject({ dueBackAt: '2026-06-02T12:00:00.000Z', renterReference: 'Hire 4711' });
});

describe('a unit that may not go out', () => {
  test('is out already: since when is said', async () => {
    await out('10:00');
    expect(await refusal(() => out('10:30'))).toMatchObject({
      code: 'unit_out',
      errors: [{ path: 'unitId', message: 'Unit N-1 is out since Tue 2 Jun 2026, 11:00.' }],
    });
  });

  test('is held: every reason is given with what lifts it', async () => {
    await back('10:00', 101);
    await back('11:30', 102);
    await reportDefect(at('11:40'), { unitId, title: 'Seat torn', holdsUnit: true });
    await reportDefect(at('11:40'), { unitId, title: 'Decal faded', holdsUnit: false });
    await recordLayUp(at('11:41'), {
      unitId,
      fromOn: '2026-06-02',
      untilOn: '2026-06-02',
      reason: 'Painting',
    });
    const { code, errors } = await refusal(() => out('12:00'));
    expect(code).toBe('unit_held');
    expect(errors.map(({ path }) => path)).toEqual(['unitId', 'unitId', 'unitId']);
    const said = errors.map(({ message }) => message).join('\n');
    expect(said).toMatch(/Carburettor rebuild of Cais Norte was due at 102\.0 h.*run 102\.0 h.*Lifted when/);
    expect(said).toMatch(/Seat torn.*Lifted when/);
    expect(said).toMatch(/Painting.*Lifted when/);
  });

  test('has less left than the outing planned: 0.9 h before the rule holds it', async () => {
    await back('11:30', 101.1);
    const refused = await refusal(() => out('12:00', { plannedHours: 1 }));
    expect(refused).toMatchObject({ code: 'unit_held', errors: [{ path: 'unitId' }] });
    expect(refused.message).toContain(
      '0.9 h are left before Carburettor rebuild of Cais Norte holds the unit',
    );
    expect(await out('12:00', { plannedHours: 0.9 })).toMatchObject({ plannedHours: 0.9 });
  });

  test('has been retired', async () => {
    await changeUnit(at('10:00'), unitId, { retired: true });
    expect(await refusal(() => out('12:00'))).toMatchObject({
      code: 'conflict',
      errors: [{ path: 'unitId' }],
    });
  });

  test('is at another dock than the one named', async () => {
    const { dock } = await openDock(database.db, { name: 'Cais Sul', fleetNumber: 'S-1' });
    const refused = await refusal(() => out('12:00', { dockId: dock.id }));
    expect(refused).toMatchObject({ errors: [{ path: 'dockId', message: 'Unit N-1 is at Cais Norte.' }] });
  });
});

test.each([
  ['at', 'to come', { at: new Date('2026-06-02T12:06:00Z') }],
  ['at', 'before the unit was last seen ashore', { at: new Date('2026-06-02T09:00:00Z') }],
  ['dueBackAt', 'not after the check-out', { dueBackAt: new Date('2026-06-02T12:00:00Z') }],
  ['dueBackAt', 'months away', { dueBackAt: new Date('2026-09-01T12:00:00Z') }],
])('%s that is %s is refused', async (path, _, entry) => {
  await back('10:00', 100.5);
  expect(await refusal(() => out('12:00', entry))).toMatchObject({
    code: 'invalid_input',
    errors: [{ path }],
  });
});

test('a telephone whose clock is four minutes fast is taken to mean now', async () => {
  expect(await out('12:00', { at: new Date('2026-06-02T12:04:00Z') })).toMatchObject({
    at: '2026-06-02T12:00:00.000Z',
  });
});

describe('the same check-out sent again', () => {
  test('answers with the first result and writes nothing, also when the unit is back by then', async () => {
    const id = randomUUID();
    const first = await out('10:00', { id, plannedHours: 1 });
    await back('11:00', 100.9);
    const before = await recordsOf(database.db);
    expect(await out('12:00', { id, plannedHours: 2 })).toEqual(first);
    expect(await recordsOf(database.db)).toEqual(before);
  });

  test('ten times at once is kept once', async () => {
    const id = randomUUID();
    const answers = await Promise.all(Array.from({ length: 10 }, () => out('10:00', { id })));
    expect(new Set(answers.map((answer) => JSON.stringify(answer))).size).toBe(1);
    expect(await database.db.selectFrom('outing').select('id').execute()).toEqual([{ id }]);
  });

  test('for another unit is refused', async () => {
    const { unit } = await openDock(database.db, { name: 'Cais Sul', fleetNumber: 'S-1' });
    const { id } = await out('10:00');
    const refused = await refusal(() => out('10:00', { id, unitId: unit.id }));
    expect(refused).toMatchObject({ code: 'conflict', errors: [{ path: 'id' }] });
  });
});

test('of two people who check one unit out at once, one is told that it is out', async () => {
  const results = await Promise.allSettled([out('10:00'), out('10:00')]);
  expect(results.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
  const refused = results.find((result) => result.status === 'rejected');
  expect(refused?.reason).toMatchObject({ code: 'unit_out' });
});
