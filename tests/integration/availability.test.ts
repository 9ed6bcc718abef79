import { randomUUID } from 'node:crypto';
import { beforeEach, describe, expect, test } from 'vitest';
import { checkIn } from '@/lib/actions/check-in';
import { checkOut } from '@/lib/actions/check-out';
import { createDock } from '@/lib/actions/create-dock';
import { createRule } from '@/lib/actions/create-rule';
import { createUnit } from '@/lib/actions/create-unit';
import { endLayUp } from '@/lib/actions/end-lay-up';
import { getAvailability } from '@/lib/actions/get-availability';
import { clearDefect } from '@/lib/actions/clear-defect';
import { recordLayUp } from '@/lib/actions/record-lay-up';
import { refreshDue } from '@/lib/actions/refresh-due';
import { reportDefect } from '@/lib/actions/report-defect';
import { createRule as createRuleInput } from '@/lib/schemas/rule';
import { asSystem, openDock } from '../support/crew';
import { testDatabase } from '../support/database';

// No worker runs in this file: whatever is held here is held by the facts alone.
const database = testDatabase();
let opened: Awaited<ReturnType<typeof openDock>>;
let unitId: string;

const at = (time: string) => asSystem(database.db, `2026-06-02T${time}:00Z`);
const ask = (query: Parameters<typeof getAvailability>[1] = {}, time = '14:00') =>
  getAvailability(at(time), query);
const back = (time: string, hours: number) => checkIn(at(time), { id: randomUUID(), unitId, hours });

beforeEach(async () => {
  opened = await openDock(database.db, { holdsAt: 102 });
  unitId = opened.unit.id;
});

test('a ready unit is listed with what is left before the rule that holds it first', async () => {
  await back('11:00', 100.7);
  const { asOf, ready, out, held } = await ask();
  expect(asOf).toBe('2026-06-02T14:00:00.000Z');
  expect(ready).toEqual([
    {
      unitId,
      fleetNumber: 'N-1',
      modelName: 'Twin of Cais Norte',
      carbCount: 2,
      dockId: opened.dock.id,
      engineHours: 100.7,
      hoursToHold: 1.3,
      outingsToHold: null,
      daysToHold: null,
      holdingRuleId: opened.rule!.id,
      holdingRuleName: 'Carburettor rebuild of Cais Norte',
    },
  ]);
  expect([out, held]).toEqual([[], []]);
});

test('hours that reach the due point hold the unit at once, though nobody has computed anything since', async () => {
  await back('10:00', 101.9);
  expect((await ask({}, '10:01')).ready).toHaveLength(1);
  await back('11:00', 102);
  const { ready, held } = await ask({}, '11:01');
  expect(ready).toEqual([]);
  expect(held).toMatchObject([
    {
      unitId,
      hoursToHold: 0,
      holds: [
        {
          reason: 'overdue',
          ruleId: opened.rule!.id,
          since: '2026-06-02T11:00:00.000Z',
          text: 'Carburettor rebuild of Cais Norte was due at 102.0 h; the unit has run 102.0 h. Lifted when a mechanic closes the task for Carburettor rebuild of Cais Norte.',
        },
      ],
    },
  ]);
});

test('a day that comes holds the unit at the dock’s midnight, and tomorrow can be asked about', async () => {
  const rule = createRuleInput.parse({
    name: 'Fire extinguisher',
    kind: 'inspection',
    appliesTo: {},
    triggers: [{ on: 'calendar', rrule: 'FREQ=YEARLY', start: '2026-06-02' }],
  });
  await createRule(at('09:00'), rule);
  await refreshDue(at('09:00'), { unitIds: [unitId] });
  // By hand: 2.0 h at 5 h in 3 days are 1.2 days, so the extinguisher's one day is nearer than the rebuild.
  expect((await ask()).ready).toMatchObject([
    { hoursToHold: 2, daysToHold: 1, holdingRuleName: 'Fire extinguisher' },
  ]);
  // Lisbon's midnight of 3 June is 23:00 UTC of the 2nd.
  expect((await ask({}, '22:59')).held).toEqual([]);
  expect((await ask({}, '23:00')).held).toMatchObject([
    { holds: [{ reason: 'overdue', since: '2026-06-02T23:00:00.000Z' }] },
  ]);
  expect((await ask({ on: '2026-06-03' })).held).toMatchObject([{ unitId, daysToHold: 0 }]);
});

describe('a day that is over', () => {
  const refused = { code: 'invalid_input', errors: [{ path: 'on' }] };

  test('at the dock is refused, its today is not', async () => {
    await expect(ask({ on: '2026-06-01' })).rejects.toMatchObject(refused);
    expect((await ask({ on: '2026-06-02' })).ready).toHaveLength(1);
    // Lisbon's midnight of 3 June is 23:00 UTC of the 2nd.
    await expect(ask({ on: '2026-06-02' }, '23:00')).rejects.toMatchObject(refused);
  });

  test('at one dock may be asked about while it is today at another', async () => {
    const west = await createDock(at('09:00'), { name: 'Pelican Pier', timeZone: 'America/New_York' });
    // At 23:00 UTC it is the evening of the 2nd in New York.
    expect((await ask({ on: '2026-06-02' }, '23:00')).ready).toHaveLength(1);
    expect((await ask({ on: '2026-06-02', dockId: west.id }, '23:00')).ready).toEqual([]);
    await expect(ask({ on: '2026-06-02', dockId: opened.dock.id }, '23:00')).rejects.toMatchObject(refused);
  });
});

describe('a planned outing', () => {
  beforeEach(() => back('11:00', 100.9));

  test('longer than what is left holds the unit for it, and says why', async () => {
    const { ready, held } = await ask({ hours: 1.2 });
    expect(ready).toEqual([]);
    expect(held).toMatchObject([
      {
        hoursToHold: 1.1,
        holds: [
          {
            reason: 'too_little_left',
            ruleId: opened.rule!.id,
            text: expect.stringContaining('1.1 h are left') as string,
          },
        ],
      },
    ]);
  });

  test('of just what is left does not', async () => {
    expect((await ask({ hours: 1.1 })).ready).toHaveLength(1);
  });
});

test('a unit that is out is listed as out, with the holds it comes back to', async () => {
  const dueBackAt = new Date('2026-06-02T12:00:00Z');
  const { id } = await checkOut(at('10:00'), { id: randomUUID(), unitId, dueBackAt });
  await reportDefect(at('10:30'), { unitId, title: 'Smoke seen', holdsUnit: true });
  expect(await ask()).toMatchObject({
    ready: [],
    held: [],
    out: [
      {
        unitId,
        outingId: id,
        startedAt: '2026-06-02T10:00:00.000Z',
        dueBackAt: '2026-06-02T12:00:00.000Z',
        holds: [{ reason: 'defect' }],
      },
    ],
  });
});

test('a defect that holds is lifted by its clearance, a lay-up by its end', async () => {
  const defect = await reportDefect(at('10:00'), { unitId, title: 'Seat torn', holdsUnit: true });
  const layUp = await recordLayUp(at('10:00'), { unitId, fromOn: '2026-06-02', reason: 'Painting' });
  expect((await ask()).held).toMatchObject([
    {
      holds: [
        { reason: 'laid_up', layUpId: layUp.id },
        { reason: 'defect', defectId: defect.id },
      ],
    },
  ]);
  await clearDefect(at('11:00'), defect.id, { note: 'Sewn' });
  await endLayUp(at('11:00'), layUp.id);
  expect((await ask()).ready).toHaveLength(1);
});

test('a lay-up holds from its first day to its last', async () => {
  await recordLayUp(at('10:00'), { unitId, fromOn: '2026-06-03', untilOn: '2026-06-04', reason: 'Painting' });
  const heldOn = async (on: string) => (await ask({ on })).held.length;
  expect([await heldOn('2026-06-02'), await heldOn('2026-06-03')]).toEqual([0, 1]);
  expect([await heldOn('2026-06-04'), await heldOn('2026-06-05')]).toEqual([1, 0]);
});

test('a new unit is held as not yet assessed until its due points are computed', async () => {
  const { model, dock } = opened;
  const unit = await createUnit(at('10:00'), {
    fleetNumber: 'N-2',
    modelId: model.id,
    dockId: dock.id,
    enteredServiceOn: '2026-06-02',
    engineHours: 0,
  });
  expect((await ask()).held).toMatchObject([{ unitId: unit.id, holds: [{ reason: 'not_assessed' }] }]);
  await refreshDue(at('10:01'), { unitIds: [unit.id] });
  expect((await ask()).held).toEqual([]);
});

test('units come in the natural order of their fleet numbers', async () => {
  const { model, dock } = opened;
  for (const fleetNumber of ['N-10', 'N-2', 'n-3'])
    await createUnit(at('10:00'), {
      fleetNumber,
      modelId: model.id,
      dockId: dock.id,
      enteredServiceOn: '2026-06-02',
      engineHours: 0,
    });
  const { held } = await ask();
  expect(held.map(({ fleetNumber }) => fleetNumber)).toEqual(['N-2', 'n-3', 'N-10']);
});
