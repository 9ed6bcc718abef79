import { beforeEach, describe, expect, test } from 'vitest';
import { createDock } from '@/lib/actions/create-dock';
import { createRule } from '@/lib/actions/create-rule';
import { createUnit } from '@/lib/actions/create-unit';
import { changeUnit } from '@/lib/actions/change-unit';
import { checkOut } from '@/lib/actions/check-out';
import { clearDefect } from '@/lib/actions/clear-defect';
import { getAvailability } from '@/lib/actions/get-availability';
import { listDefects } from '@/lib/actions/list-defects';
import { refreshDue } from '@/lib/actions/refresh-due';
import { reportDefect } from '@/lib/actions/report-defect';
import type { CreateUnit } from '@/lib/schemas/unit';
import { createRule as createRuleInput } from '@/lib/schemas/rule';
import { recordsOf } from '../support/bad-input';
import { asSystem, openDock } from '../support/crew';
import { testDatabase } from '../support/database';

const database = testDatabase();
let opened: Awaited<ReturnType<typeof openDock>>;
let usDockId: string;
const now = () => asSystem(database.db, '2026-06-02T12:00:00Z');
const outingId = '2f0c1c1e-2f61-4d0e-8a49-51c0a1d2b3c4';

beforeEach(async () => {
  opened = await openDock(database.db);
  usDockId = (await createDock(now(), { name: 'Pelican Pier', timeZone: 'America/New_York' })).id;
});

const add = (unit: Partial<CreateUnit>) =>
  createUnit(now(), {
    fleetNumber: 'P-1',
    modelId: opened.model.id,
    dockId: usDockId,
    enteredServiceOn: '2026-06-01',
    engineHours: 12.5,
    ...unit,
  });

describe('a new unit', () => {
  test('at a dock of US craft has its numbers in the federal spelling', async () => {
    // NH 1234 BD is an example of 33 CFR 174.23; the hull number follows the pattern of 33 CFR 181.25.
    const unit = await add({ hin: 'us-abc45567d485', registration: 'nh-1234-bd' });
    expect(unit).toMatchObject({
      hin: 'ABC45567D485',
      registration: 'NH 1234 BD',
      engineHours: 12.5,
      outings: 0,
    });
  });

  test('there with numbers that are none is refused by both', async () => {
    const before = await recordsOf(database.db);
    await expect(add({ hin: 'ABCO5567D485', registration: '7-XYZ' })).rejects.toMatchObject({
      code: 'invalid_input',
      errors: [{ path: 'hin' }, { path: 'registration' }],
    });
    expect(await recordsOf(database.db)).toEqual(before);
  });

  test('at another country’s dock keeps its numbers as they are', async () => {
    const unit = await add({ dockId: opened.dock.id, hin: 'PT-XYZ 77', registration: '123 LX' });
    expect(unit).toMatchObject({ hin: 'PT-XYZ 77', registration: '123 LX' });
  });

  test('has its first reading at the start of the day it entered service there, never later than now', async () => {
    // New York's midnight in summer is 04:00 UTC.
    expect((await add({})).readAt).toBe('2026-06-01T04:00:00.000Z');
    const tomorrow = await add({ fleetNumber: 'P-2', enteredServiceOn: '2026-06-03' });
    expect(tomorrow.readAt).toBe('2026-06-02T12:00:00.000Z');
  });

  test('cannot have the hull number of one that is still in the fleet', async () => {
    const first = await add({ hin: 'ABC45567D485' });
    const same = { fleetNumber: 'P-2', hin: 'ABC 45567 D485' };
    await expect(add(same)).rejects.toMatchObject({ code: 'conflict', errors: [{ path: 'hin' }] });
    await changeUnit(now(), first.id, { retired: true });
    expect(await add(same)).toMatchObject({ hin: 'ABC45567D485' });
  });
});

describe('a change of a unit', () => {
  test('of what decides its rules holds it until it has been assessed again', async () => {
    const id = opened.unit.id;
    const ready = async () => (await getAvailability(now(), {})).ready.length;
    expect(await ready()).toBe(1);
    await changeUnit(now(), id, { fleetNumber: 'N-7' });
    expect(await ready()).toBe(1);
    await changeUnit(now(), id, { carbCount: 3 });
    expect(await ready()).toBe(0);
    await refreshDue(now(), { unitIds: [id] });
    expect(await ready()).toBe(1);
  });

  test('to a dock of US craft checks the numbers it has', async () => {
    const unit = await add({ dockId: opened.dock.id, hin: 'PT-XYZ 77' });
    const moved = changeUnit(now(), unit.id, { dockId: usDockId });
    await expect(moved).rejects.toMatchObject({ errors: [{ path: 'hin' }] });
    expect(await changeUnit(now(), unit.id, { dockId: usDockId, hin: null })).toMatchObject({
      dockId: usDockId,
    });
  });

  test('cannot retire or move it while it is out', async () => {
    const id = opened.unit.id;
    await checkOut(now(), { id: outingId, unitId: id });
    const out = (path: string) => ({ code: 'unit_out', errors: [{ path }] });
    await expect(changeUnit(now(), id, { retired: true })).rejects.toMatchObject(out('retired'));
    await expect(changeUnit(now(), id, { dockId: usDockId })).rejects.toMatchObject(out('dockId'));
  });

  test('that retires it takes it off the list, and it stays retired', async () => {
    const id = opened.unit.id;
    expect(await changeUnit(now(), id, { retired: true })).toMatchObject({
      retiredAt: '2026-06-02T12:00:00.000Z',
    });
    const { ready, held, out } = await getAvailability(now(), {});
    expect([...ready, ...held, ...out]).toEqual([]);
    await expect(changeUnit(now(), id, { fleetNumber: 'N-8' })).rejects.toMatchObject({ code: 'conflict' });
  });
});

describe('a defect', () => {
  test('reported twice with one id is one defect; cleared, its unbegun repair is withdrawn', async () => {
    const rule = {
      name: 'Yearly',
      kind: 'inspection',
      appliesTo: {},
      triggers: [{ on: 'outings', every: 500 }],
    };
    await createRule(now(), createRuleInput.parse(rule));
    const entry = { id: outingId, unitId: opened.unit.id, title: 'Seat torn', holdsUnit: true };
    const first = await reportDefect(now(), entry);
    expect(await reportDefect(now(), entry)).toEqual(first);
    await refreshDue(now(), { unitIds: [opened.unit.id] });
    const task = () =>
      database.db
        .selectFrom('task')
        .select(['title', 'ended_at'])
        .where('defect_id', '=', first.id)
        .execute();
    expect(await task()).toEqual([{ title: 'Seat torn', ended_at: null }]);
    expect(await clearDefect(now(), first.id, { note: 'Sewn' })).toMatchObject({ clearNote: 'Sewn' });
    expect(await task()).toMatchObject([{ ended_at: new Date('2026-06-02T12:00:00Z') }]);
    expect((await listDefects(now(), { open: true })).items).toEqual([]);
    await expect(clearDefect(now(), first.id, { note: 'Again' })).rejects.toMatchObject({ code: 'conflict' });
  });
});
