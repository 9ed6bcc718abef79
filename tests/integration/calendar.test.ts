import { beforeEach, describe, expect, test } from 'vitest';
import { refreshDue } from '@/lib/actions/refresh-due';
import { SYSTEM } from '@/lib/domain/access';
import { addDays, localDay } from '@/lib/domain/calendar-day';
import type { Calendar } from '@/lib/schemas/calendar';
import type { Task, TaskPage } from '@/lib/schemas/task';
import { addDock } from '../support/craft';
import { testDatabase } from '../support/database';
import { addUnit } from '../support/fleet';
import { testApi, type Caller } from '../support/http';

const database = testDatabase();
const api = testApi(database);

const ZONE = 'America/New_York';
const today = () => localDay(new Date(), ZONE);
const dayIn = (days: number) => addDays(today(), days);

let mechanic: Caller;
let stranger: Caller;
let unit: { dockId: string; unitId: string; ruleId: string };

/** A unit at 40.0 h whose service, due every 50 h without allowance or lead, holds it. */
beforeEach(async () => {
  unit = await addUnit(database.db, { every: 500, engineHoursTenths: 400, timeZone: ZONE });
  const elsewhere = await addDock(database.db, 'Elsewhere');
  mechanic = await api.caller('mechanic');
  stranger = await api.caller('mechanic', { dockIds: [elsewhere] });
  await work();
});

const work = () =>
  refreshDue({ db: database.db, actor: SYSTEM, now: new Date() }, { unitIds: [unit.unitId] });

/** What a check-in at 50.5 h leaves behind: the meter is past the due hour, the worker has not looked yet. */
async function runPastDue(): Promise<void> {
  const meter = { shown_tenths: 505, engine_hours_tenths: 505, read_at: new Date() };
  await database.db.updateTable('live_meter').set(meter).where('unit_id', '=', unit.unitId).execute();
}

async function dueOn(day: string): Promise<void> {
  const point = { due_on: day, upcoming_from_on: day, overdue_from_on: addDays(day, 1) };
  const none = { due_tenths: null, upcoming_from_tenths: null, overdue_from_tenths: null };
  await database.db
    .updateTable('due_point')
    .set({ ...none, ...point })
    .where('unit_id', '=', unit.unitId)
    .execute();
}

async function calendar(query = `from=${dayIn(-30)}&to=${dayIn(30)}`, by = mechanic): Promise<Calendar> {
  const { status, body } = await by.send<Calendar>('GET', `/calendar?${query}`);
  expect(status, JSON.stringify(body)).toBe(200);
  return body;
}

describe('on the calendar', () => {
  test('a duty that goes by its meter stands without a day until it is due', async () => {
    const { events, undated } = await calendar();
    expect(events).toEqual([]);
    expect(undated).toMatchObject([
      { kind: 'due', unitId: unit.unitId, taskId: null, state: 'clear', dueAtHours: 50, leftHours: 10 },
    ]);
  });

  test('a unit just run past its window is overdue today, before the worker has looked and after', async () => {
    await runPastDue();
    const overdue = {
      unitId: unit.unitId,
      ruleId: unit.ruleId,
      state: 'overdue',
      on: today(),
      holdsUnit: true,
    };
    expect((await calendar()).events).toMatchObject([{ ...overdue, kind: 'due', taskId: null }]);
    await work();
    const { events, undated } = await calendar();
    expect(events).toMatchObject([{ ...overdue, kind: 'task', dueAtHours: 50, leftHours: -0.5 }]);
    expect(undated).toEqual([]);
  });

  test('a duty by the calendar stands on its due day, and on today once that is over', async () => {
    await dueOn(dayIn(9));
    expect((await calendar()).events).toMatchObject([
      { kind: 'due', on: dayIn(9), dueOn: dayIn(9), state: 'clear' },
    ]);
    await dueOn(dayIn(-9));
    expect((await calendar()).events).toMatchObject([{ on: today(), dueOn: dayIn(-9), state: 'overdue' }]);
    expect((await calendar(`from=${dayIn(1)}&to=${dayIn(30)}`)).events).toEqual([]);
  });

  test('a planned task stands on its day, and a closed one on the day it was closed', async () => {
    const { body: task } = await mechanic.send<TaskPage>('POST', '/tasks', {
      unitId: unit.unitId,
      ruleId: unit.ruleId,
      plannedOn: dayIn(5),
    });
    expect((await calendar()).events).toMatchObject([{ kind: 'task', taskId: task.id, on: dayIn(5) }]);
    await mechanic.send('POST', `/tasks/${task.id}/closure`, {});
    await work();
    const { events } = await calendar();
    expect(events).toMatchObject([{ kind: 'task', taskId: task.id, on: today(), state: 'closed' }]);
  });

  test('nothing of docks one does not work at is shown, nor of another dock when one is named', async () => {
    await runPastDue();
    expect((await calendar(undefined, stranger)).events).toEqual([]);
    expect(
      (await stranger.send('GET', `/calendar?from=${today()}&to=${today()}&dockId=${unit.dockId}`)).status,
    ).toBe(403);
    expect((await calendar(`from=${today()}&to=${today()}&dockId=${unit.dockId}`)).events).toHaveLength(1);
  });

  test('it is fresh as of the oldest work that waits for the worker', async () => {
    const before = new Date();
    expect(new Date((await calendar()).freshAsOf).getTime()).toBeGreaterThanOrEqual(before.getTime());
    const { body } = await mechanic.send<TaskPage>('POST', '/tasks', {
      unitId: unit.unitId,
      ruleId: unit.ruleId,
    });
    await mechanic.send('POST', `/tasks/${body.id}/closure`, {});
    const first = (await calendar()).freshAsOf;
    expect((await calendar()).freshAsOf).toBe(first);
    const { items } = (await mechanic.send<{ items: Task[] }>('GET', '/tasks?state=closed')).body;
    expect(items).toHaveLength(1);
  });

  test.each([
    ['from', `to=2026-01-01`],
    ['from', `from=2026-02-30&to=2026-03-01`],
    ['to', `from=2026-03-02&to=2026-03-01`],
    ['to', `from=2026-01-01&to=2026-12-31`],
    ['dockId', `from=2026-01-01&to=2026-01-31&dockId=x`],
  ])('a wrong %s is refused by name (%s)', async (field, query) => {
    const { status, body } = await mechanic.send('GET', `/calendar?${query}`);
    const errors = (body as unknown as { errors: { path: string }[] }).errors;
    expect([status, errors.map(({ path }) => path)]).toEqual([422, [field]]);
  });
});
