import { expect, test } from 'vitest';
import { closeTask } from '@/lib/actions/close-task';
import { createRule } from '@/lib/actions/create-rule';
import { listClosings } from '@/lib/actions/list-closings';
import { openTask } from '@/lib/actions/open-task';
import { recordBaseline } from '@/lib/actions/record-baseline';
import { SYSTEM } from '@/lib/domain/access';
import { createRule as ruleShape } from '@/lib/schemas/rule';
import { addCraft, addDock, addModel } from '../support/craft';
import { testDatabase } from '../support/database';

const database = testDatabase();
const at = (instant: string) => ({ db: database.db, actor: SYSTEM, now: new Date(instant) });

/** A unit at a dock of this time zone, with the open task of a rule that it was never done under. */
async function addUnitAt(timeZone: string) {
  const dockId = await addDock(database.db, 'Far dock', timeZone);
  const modelId = await addModel(database.db, 'Twin');
  const unitId = await addCraft(database.db, {
    fleetNumber: 'F-1',
    modelId,
    dockId,
    engineHoursTenths: 4000,
  });
  const rule = await createRule(
    at('2026-06-01T00:00:00Z'),
    ruleShape.parse({
      name: 'Oil and filter',
      kind: 'service',
      appliesTo: {},
      triggers: [{ on: 'engine_hours', every: 50 }],
    }),
  );
  const task = await openTask(at('2026-06-01T00:00:00Z'), { unitId, ruleId: rule.id });
  return { unitId, ruleId: rule.id, taskId: task.id };
}

const note = 'The log of the owner before us.';

// Auckland is twelve hours ahead of UTC in July: its second of July is eight hours old at 20:00 UTC on the first.
test('east of Greenwich, work can be closed on the morning of the day a baseline is of', async () => {
  const { unitId, ruleId, taskId } = await addUnitAt('Pacific/Auckland');
  const baseline = { ruleId, closedOn: '2026-07-02', engineHours: 390, note };
  await recordBaseline(at('2026-07-01T20:00:00Z'), unitId, baseline);
  const closure = await closeTask(at('2026-07-01T21:00:00Z'), taskId, {});
  expect(closure).toMatchObject({ closedOn: '2026-07-02', engineHours: 400 });
  const closings = await listClosings(at('2026-07-01T22:00:00Z'), unitId, { ruleId });
  expect(closings.map(({ engineHours }) => engineHours)).toEqual([390, 400]);
});

// Honolulu is ten hours behind UTC: 06:00 UTC on the second is 20:00 on the first.
test('west of Greenwich, a baseline comes after work of the evening before its day', async () => {
  const { unitId, ruleId, taskId } = await addUnitAt('Pacific/Honolulu');
  await closeTask(at('2026-07-02T06:00:00Z'), taskId, {});
  await recordBaseline(at('2026-07-02T20:00:00Z'), unitId, {
    ruleId,
    closedOn: '2026-07-02',
    engineHours: 400,
    note,
  });
  const closings = await listClosings(at('2026-07-02T21:00:00Z'), unitId, { ruleId });
  expect(closings.map(({ on }) => on)).toEqual(['2026-07-01', '2026-07-02']);
});
