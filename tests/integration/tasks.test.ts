import { sql } from 'kysely';
import { beforeEach, describe, expect, test } from 'vitest';
import { refreshDue } from '@/lib/actions/refresh-due';
import { SYSTEM } from '@/lib/domain/access';
import { addDays } from '@/lib/domain/calendar-day';
import type { Closure, Task, TaskPage } from '@/lib/schemas/task';
import { addDock } from '../support/craft';
import { addUnit } from '../support/fleet';
import { testDatabase } from '../support/database';
import { testApi, type Caller } from '../support/http';

const database = testDatabase();
const api = testApi(database);

let manager: Caller;
let mechanic: Caller;
let second: Caller;
let hand: Caller;
let stranger: Caller;
let unit: { dockId: string; unitId: string; ruleId: string };

const HOUR = 3_600_000;
/** A day so many days from today, by UTC. */
const dayIn = (days: number) => addDays(new Date().toISOString().slice(0, 10), days);
const ago = (hours: number) => new Date(Date.now() - hours * HOUR);

/** A unit at 52.0 h whose service, due every 50 h without allowance, holds it; last read two hours ago. */
beforeEach(async () => {
  unit = await addUnit(database.db, { every: 500, lead: 50, engineHoursTenths: 520 });
  await addReading(48, 480);
  await addReading(2, 520);
  const elsewhere = await addDock(database.db, 'Elsewhere');
  [manager, mechanic, second, hand, stranger] = await Promise.all([
    api.caller('manager', { name: 'Ines Marlow' }),
    api.caller('mechanic', { name: 'Bo Tarn', dockIds: [unit.dockId] }),
    api.caller('mechanic', { name: 'Kit Loe' }),
    api.caller('dock', { name: 'Ada Reef' }),
    api.caller('mechanic', { name: 'Far Away', dockIds: [elsewhere] }),
  ]);
  await work();
});

async function addReading(hoursAgo: number, tenths: number) {
  const row = { unit_id: unit.unitId, taken_at: ago(hoursAgo), shown_tenths: tenths, base_tenths: 0 };
  await database.db
    .insertInto('reading')
    .values({ ...row, source: 'check_in' })
    .execute();
  const meter = { read_at: row.taken_at, shown_tenths: tenths, engine_hours_tenths: tenths };
  await database.db.updateTable('live_meter').set(meter).where('unit_id', '=', unit.unitId).execute();
}

/** What the worker does with what is queued for the unit. */
const work = () =>
  refreshDue({ db: database.db, actor: SYSTEM, now: new Date() }, { unitIds: [unit.unitId] });

async function reasonsHeld(): Promise<string[]> {
  const { rows } = await sql<{ reason: string }>`
    select reason from unit_hold(now(), null) where unit_id = ${unit.unitId} order by 1`.execute(database.db);
  return rows.map((row) => row.reason);
}

async function dueAtTenths(): Promise<number | null | undefined> {
  const row = await database.db
    .selectFrom('due_point')
    .select('due_tenths')
    .where('unit_id', '=', unit.unitId)
    .executeTakeFirst();
  return row?.due_tenths;
}

async function serviceTask(): Promise<Task> {
  const { body } = await mechanic.send<{ items: Task[] }>('GET', `/tasks?unitId=${unit.unitId}`);
  expect(body.items).toHaveLength(1);
  return body.items[0]!;
}

const repair = { kind: 'repair', title: 'Cracked hatch' };
const openRepair = (fields: object = {}) =>
  mechanic.send<TaskPage>('POST', '/tasks', { unitId: unit.unitId, ...repair, ...fields });
const close = (id: string, body: object = {}, by = mechanic) =>
  by.send<Closure>('POST', `/tasks/${id}/closure`, body);

/** The one field a refusal names. */
const named = (body: unknown) => (body as { errors: { path: string }[] }).errors.map((error) => error.path);
const code = (body: unknown) => (body as { code: string }).code;

describe('the list of tasks', () => {
  test("shows a rule's task with how far past due it is and that it holds its unit", async () => {
    expect(await serviceTask()).toMatchObject({
      origin: 'rule',
      kind: 'service',
      progress: 'open',
      state: 'overdue',
      holdsUnit: true,
      urgency: 'holding',
      points: [{ on: 'engine_hours', dueAtHours: 50, left: -2, leftToOverdue: -2, state: 'overdue' }],
    });
  });

  test('puts what holds a unit first, then what is planned for today, then the rest, page by page', async () => {
    const { body: later } = await openRepair({ title: 'Later', plannedOn: dayIn(180) });
    const { body: none } = await openRepair({ title: 'Some day' });
    const { body: today } = await openRepair({ title: 'Today' });
    await mechanic.send('PATCH', `/tasks/${today.id}`, { plannedOn: today.today });
    const service = await serviceTaskOf();
    const seen: string[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const page: { body: { items: Task[]; nextCursor: string | null } } = await mechanic.send(
        'GET',
        `/tasks?limit=1${cursor && `&cursor=${cursor}`}`,
      );
      seen.push(...page.body.items.map((task) => task.id));
      cursor = page.body.nextCursor;
    }
    expect(seen).toEqual([service, today.id, none.id, later.id]);
  });

  const serviceTaskOf = async () =>
    (await database.db.selectFrom('task').select('id').where('origin', '=', 'rule').executeTakeFirstOrThrow())
      .id;

  test('is narrowed by dock, kind, state and to what I am at', async () => {
    const { body: mine } = await openRepair();
    await mechanic.send('PATCH', `/tasks/${mine.id}`, { started: true });
    const ids = async (query: string) =>
      (await mechanic.send<{ items: Task[] }>('GET', `/tasks?${query}`)).body.items.map((task) => task.id);
    expect(await ids('mine=true')).toEqual([mine.id]);
    expect(await ids('kind=repair')).toEqual([mine.id]);
    expect(await ids(`dockId=${unit.dockId}`)).toHaveLength(2);
    await close(mine.id);
    expect(await ids('kind=repair')).toEqual([]);
    expect(await ids('state=closed')).toEqual([mine.id]);
    expect(await ids('state=all')).toHaveLength(2);
  });

  test.each(['nonsense', 'e30', 'eyJhdCI6MX0'])(
    'refuses the cursor %s that no list answered',
    async (cursor) => {
      for (const state of ['open', 'closed', 'all']) {
        const { status, body } = await mechanic.send('GET', `/tasks?state=${state}&cursor=${cursor}`);
        expect([status, named(body)]).toEqual([422, ['cursor']]);
      }
      expect(named((await mechanic.send('GET', '/tasks?state=ajar')).body)).toEqual(['state']);
    },
  );

  test('shows nobody the tasks of docks they do not work at', async () => {
    const { body } = await stranger.send<{ items: Task[] }>('GET', '/tasks');
    expect(body.items).toEqual([]);
    expect((await stranger.send('GET', `/tasks?dockId=${unit.dockId}`)).status).toBe(403);
    const { id } = await serviceTask();
    expect((await stranger.send('GET', `/tasks/${id}`)).status).toBe(403);
    expect((await hand.send('GET', `/tasks/${id}`)).status).toBe(200);
  });
});

describe('an ad-hoc repair', () => {
  test('is opened by a mechanic, and holds nothing unless that is said', async () => {
    const { status, body } = await openRepair({ detail: 'Port side' });
    expect(status).toBe(201);
    expect(body).toMatchObject({
      ...repair,
      origin: 'person',
      detail: 'Port side',
      holdsUnit: false,
      revision: 1,
    });
  });

  test('that holds makes a holding defect with it, which its closing clears', async () => {
    await close((await serviceTask()).id);
    await work();
    const { body } = await openRepair({ holdsUnit: true });
    expect(body.holdsUnit).toBe(true);
    expect(await reasonsHeld()).toEqual(['defect']);
    await work();
    expect(
      await database.db.selectFrom('task').selectAll().where('defect_id', 'is not', null).execute(),
    ).toHaveLength(1);
    expect((await close(body.id, { note: 'New hatch fitted' })).status).toBe(201);
    expect(await reasonsHeld()).toEqual([]);
    const defect = await database.db.selectFrom('defect').selectAll().executeTakeFirstOrThrow();
    expect(defect).toMatchObject({ cleared_by: mechanic.personId, clear_note: 'New hatch fitted' });
  });

  test.each([
    ['a dock hand', () => hand.send('POST', '/tasks', { unitId: unit.unitId, ...repair }), 403],
    [
      'a mechanic of another dock',
      () => stranger.send('POST', '/tasks', { unitId: unit.unitId, ...repair }),
      403,
    ],
  ])('is refused to %s', async (_who, ask, status) => {
    expect((await ask()).status).toBe(status);
    expect(await database.db.selectFrom('task').selectAll().where('origin', '=', 'person').execute()).toEqual(
      [],
    );
  });

  test.each([
    ['unitId', { unitId: 'x' }],
    ['unitId', { unitId: '00000000-0000-4000-8000-000000000000' }],
    ['kind', { kind: 'rebuild' }],
    ['kind', { kind: undefined }],
    ['title', { title: ' ' }],
    ['title', { title: undefined }],
    ['plannedOn', { plannedOn: '2027-02-29' }],
    ['plannedOn', { plannedOn: '2020-01-01' }],
    ['holdsUnit', { holdsUnit: 'yes' }],
    ['holdsUnit', { kind: 'service', holdsUnit: true }],
    ['colour', { colour: 'red' }],
  ])('with a wrong %s is refused by name and not opened (%j)', async (field, fields) => {
    const { status, body } = await openRepair(fields);
    expect(status).toBeGreaterThanOrEqual(400);
    expect(status).toBeLessThan(500);
    expect(named(body)).toEqual([field]);
    expect(await database.db.selectFrom('task').selectAll().where('origin', '=', 'person').execute()).toEqual(
      [],
    );
    expect(await database.db.selectFrom('defect').selectAll().execute()).toEqual([]);
  });
});

describe("a rule's task before its lead", () => {
  test('is opened by naming the rule, so that it can be planned, and only once', async () => {
    await close((await serviceTask()).id, {});
    await work();
    const input = { unitId: unit.unitId, ruleId: unit.ruleId, plannedOn: dayIn(90) };
    const { status, body } = await mechanic.send<TaskPage>('POST', '/tasks', input);
    expect(status).toBe(201);
    expect(body).toMatchObject({
      origin: 'rule',
      kind: 'service',
      state: 'clear',
      plannedOn: dayIn(90),
      expectedMinutes: 30,
    });
    await work();
    expect((await serviceTask()).id).toBe(body.id);
    const again = await mechanic.send('POST', '/tasks', input);
    expect([again.status, named(again.body)]).toEqual([409, ['ruleId']]);
  });
});

describe('a task', () => {
  let id: string;
  beforeEach(async () => {
    id = (await openRepair()).body.id;
  });
  const change = (body: object, by = mechanic) => by.send<TaskPage>('PATCH', `/tasks/${id}`, body);

  test('is started by one person; a second is told by whom', async () => {
    const { body } = await change({ started: true });
    expect(body).toMatchObject({ progress: 'started', startedBy: { name: 'Bo Tarn' } });
    const other = await change({ started: true }, second);
    expect([other.status, named(other.body)]).toEqual([409, ['started']]);
    expect(JSON.stringify(other.body)).toContain('Bo Tarn');
    expect((await change({ started: false })).body).toMatchObject({ progress: 'open', startedBy: null });
  });

  test('is planned on a day, on another, and on none', async () => {
    expect((await change({ plannedOn: dayIn(150) })).body.plannedOn).toBe(dayIn(150));
    expect((await change({ plannedOn: dayIn(151) })).body.plannedOn).toBe(dayIn(151));
    expect((await change({ plannedOn: null })).body.plannedOn).toBeNull();
  });

  test('changed since it was read is not changed over the other one', async () => {
    const { body: first } = await change({ detail: 'Starboard', revision: 1 });
    expect(first.revision).toBe(2);
    const late = await change({ plannedOn: dayIn(150), revision: 1 }, second);
    expect([late.status, code(late.body), named(late.body)]).toEqual([409, 'conflict', ['revision']]);
    expect((await mechanic.send('GET', `/tasks/${id}`)).body).toMatchObject({
      detail: 'Starboard',
      plannedOn: null,
    });
  });

  test.each([
    ['started', { started: 'yes' }],
    ['plannedOn', { plannedOn: '2027-13-01' }],
    ['plannedOn', { plannedOn: '2020-01-01' }],
    ['plannedOn', { plannedOn: dayIn(900) }],
    ['title', { title: '' }],
    ['revision', { revision: 'x', started: true }],
    ['', {}],
  ])('with a wrong %s is refused by name and stays as it was (%j)', async (field, fields) => {
    const { status, body } = await change(fields);
    expect(status).toBe(422);
    expect(named(body)).toEqual([field]);
    expect((await mechanic.send('GET', `/tasks/${id}`)).body).toMatchObject({
      revision: 1,
      title: 'Cracked hatch',
    });
  });

  test('is not for a dock hand to change, nor for a mechanic elsewhere', async () => {
    expect((await change({ started: true }, hand)).status).toBe(403);
    expect((await change({ started: true }, stranger)).status).toBe(403);
  });

  test('is noted on by who works on it; the notes name who wrote them', async () => {
    const { status, body } = await mechanic.send('POST', `/tasks/${id}/notes`, { text: 'Hinge ordered' });
    expect(status).toBe(201);
    expect(body).toMatchObject({ text: 'Hinge ordered', writtenBy: { name: 'Bo Tarn' } });
    const empty = await mechanic.send('POST', `/tasks/${id}/notes`, { text: ' ' });
    expect([empty.status, named(empty.body)]).toEqual([422, ['text']]);
    expect((await mechanic.send<TaskPage>('GET', `/tasks/${id}`)).body.notes).toHaveLength(1);
  });

  test('is withdrawn with a reason, which a second withdrawal is told', async () => {
    const withdraw = (body: object) => mechanic.send('POST', `/tasks/${id}/withdrawal`, body);
    expect(named((await withdraw({})).body)).toEqual(['reason']);
    expect((await withdraw({ reason: 'Not cracked after all' })).body).toMatchObject({
      progress: 'withdrawn',
      withdrawReason: 'Not cracked after all',
    });
    const again = await withdraw({ reason: 'Twice' });
    expect([again.status, code(again.body)]).toEqual([409, 'conflict']);
    expect(JSON.stringify(again.body)).toContain('Not cracked after all');
    expect((await change({ started: true })).status).toBe(409);
  });

  test('of a defect takes its defect with it when withdrawn', async () => {
    const { body } = await openRepair({ holdsUnit: true });
    await mechanic.send('POST', `/tasks/${body.id}/withdrawal`, { reason: 'A shadow' });
    const defect = await database.db.selectFrom('defect').selectAll().executeTakeFirstOrThrow();
    expect(defect.clear_note).toBe('Withdrawn: A shadow');
    expect(await reasonsHeld()).toEqual(['overdue']);
  });

  test('of a rule is not withdrawn while it is due, since it would come back', async () => {
    const service = await serviceTaskId();
    const { status, body } = await mechanic.send('POST', `/tasks/${service}/withdrawal`, {
      reason: 'No time',
    });
    expect([status, code(body)]).toEqual([409, 'conflict']);
    expect(JSON.stringify(body)).toContain('come back');
  });

  const serviceTaskId = async () =>
    (await database.db.selectFrom('task').select('id').where('origin', '=', 'rule').executeTakeFirstOrThrow())
      .id;
});

describe('closing', () => {
  test('records hours and who, moves the due point and frees the unit', async () => {
    const task = await serviceTask();
    expect(await reasonsHeld()).toEqual(['overdue']);
    const { status, body } = await close(task.id, { minutes: 40, note: 'Oil and filter' });
    expect(status).toBe(201);
    expect(body).toMatchObject({
      taskId: task.id,
      engineHours: 52,
      minutes: 40,
      note: 'Oil and filter',
      closedBy: { name: 'Bo Tarn' },
    });
    expect(body.heldSince).not.toBeNull();
    await work();
    expect(await reasonsHeld()).toEqual([]);
    // Closed at 52.0 h outside a window of nothing: due again 50 h after it was done.
    expect(await dueAtTenths()).toBe(1020);
    expect((await mechanic.send('GET', `/tasks/${task.id}`)).body).toMatchObject({
      progress: 'closed',
      state: null,
      closed: { engineHours: 52, closedBy: { name: 'Bo Tarn' } },
    });
  });

  test('by two people at once makes one closure; the other is told by whom', async () => {
    const { id } = await serviceTask();
    const answers = await Promise.all([close(id, {}, mechanic), close(id, {}, second)]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409]);
    const refused = answers.find((answer) => answer.status === 409)!;
    expect(JSON.stringify(refused.body)).toMatch(/(Bo Tarn|Kit Loe) closed this task already/);
    expect(await database.db.selectFrom('closure').selectAll().execute()).toHaveLength(1);
  });

  test('with hours above the live meter is a reading too', async () => {
    await close((await serviceTask()).id, { engineHours: 53.5 });
    const reading = await database.db
      .selectFrom('reading')
      .selectAll()
      .where('source', '=', 'closure')
      .executeTakeFirstOrThrow();
    expect(reading).toMatchObject({ engine_hours_tenths: 535, recorded_by: mechanic.personId });
    const meter = await database.db
      .selectFrom('live_meter')
      .selectAll()
      .where('unit_id', '=', unit.unitId)
      .executeTakeFirstOrThrow();
    expect(meter).toMatchObject({ engine_hours_tenths: 535, shown_tenths: 535, reading_id: reading.id });
  });

  test('in the past takes the hours of then, and lower hours only where they fit the readings', async () => {
    const { body } = await close((await serviceTask()).id, { at: ago(24).toISOString() });
    expect(body).toMatchObject({ engineHours: 48 });
    const { id } = (await openRepair()).body;
    expect((await close(id, { at: ago(24).toISOString(), engineHours: 50 })).body).toMatchObject({
      engineHours: 50,
    });
    expect(
      await database.db.selectFrom('reading').selectAll().where('source', '=', 'closure').execute(),
    ).toEqual([]);
  });

  test.each([
    ['at', { at: 'yesterday' }, 422],
    ['at', { at: '2077-01-01T00:00:00Z' }, 422],
    ['at', { at: '2020-01-01T00:00:00Z' }, 422],
    ['engineHours', { engineHours: -1 }, 422],
    ['engineHours', { engineHours: 51.9 }, 422],
    ['engineHours', { engineHours: 60 }, 422],
    ['engineHours', { engineHours: 52.55 }, 422],
    ['minutes', { minutes: -5 }, 422],
    ['minutes', { minutes: 1.5 }, 422],
    ['results', { results: 'all fine' }, 422],
    ['results', { results: [{ stepKey: 'look', value: { kind: 'check', outcome: 'pass' } }] }, 422],
    ['partsUsed', { partsUsed: 'a kit' }, 422],
    ['note', { note: 5 }, 422],
  ])('with a wrong %s is refused by name and closes nothing (%j)', async (field, fields, status) => {
    const { id } = await serviceTask();
    const answer = await close(id, fields);
    expect([answer.status, named(answer.body)]).toEqual([status, [field]]);
    expect(await database.db.selectFrom('closure').selectAll().execute()).toEqual([]);
    expect((await serviceTask()).progress).toBe('open');
  });

  test('with an unusual run asks for a note, and keeps it for review', async () => {
    await database.db
      .updateTable('reading')
      .set({ taken_at: ago(100) })
      .where('shown_tenths', '=', 520)
      .execute();
    const { id } = await serviceTask();
    const asked = await close(id, { engineHours: 70 });
    expect([asked.status, code(asked.body), named(asked.body)]).toEqual([422, 'reason_needed', ['note']]);
    expect((await close(id, { engineHours: 70, note: 'Ran in the test tank' })).status).toBe(201);
    const reading = await database.db
      .selectFrom('reading')
      .selectAll()
      .where('source', '=', 'closure')
      .executeTakeFirstOrThrow();
    expect(reading).toMatchObject({ review_code: 'unusual_jump', confirm_reason: 'Ran in the test tank' });
  });

  test('counts the outings made until then', async () => {
    const outing = (id: string, hoursAgo: number) => ({
      id,
      unit_id: unit.unitId,
      dock_id: unit.dockId,
      started_at: ago(hoursAgo + 1),
      ended_at: ago(hoursAgo),
      planned_tenths: null,
      renter_reference: null,
      ended_dock_id: null,
      checked_out_by: null,
      checked_in_by: null,
      voided_by: null,
      void_reason: null,
    });
    const ids = ['00000000-0000-4000-8000-000000000001', '00000000-0000-4000-8000-000000000002'];
    await database.db
      .insertInto('outing')
      .values([outing(ids[0]!, 30), outing(ids[1]!, 2)])
      .execute();
    await database.db
      .updateTable('live_meter')
      .set({ outing_count: 2 })
      .where('unit_id', '=', unit.unitId)
      .execute();
    expect((await close((await serviceTask()).id, { at: ago(10).toISOString() })).body.outings).toBe(1);
    expect((await close((await openRepair()).body.id)).body.outings).toBe(2);
  });

  test('is refused while the unit is out, but not for work done before it went', async () => {
    const row = { id: '00000000-0000-4000-8000-000000000003', unit_id: unit.unitId, dock_id: unit.dockId };
    await sql`insert into outing (id, unit_id, dock_id, started_at) values (${row.id}, ${row.unit_id}, ${row.dock_id},
      ${ago(1)})`.execute(database.db);
    const { id } = await serviceTask();
    const refused = await close(id);
    expect([refused.status, code(refused.body)]).toEqual([409, 'unit_out']);
    expect((await close(id, { at: ago(1.5).toISOString() })).status).toBe(201);
  });

  test('is refused before the same rule was last closed', async () => {
    await close((await serviceTask()).id);
    await work();
    const { body } = await mechanic.send<TaskPage>('POST', '/tasks', {
      unitId: unit.unitId,
      ruleId: unit.ruleId,
    });
    const answer = await close(body.id, { at: ago(1).toISOString() });
    expect([answer.status, named(answer.body)]).toEqual([422, ['at']]);
  });

  test('is not for a dock hand, nor for a mechanic elsewhere, and not of an unknown task', async () => {
    const { id } = await serviceTask();
    expect((await close(id, {}, hand)).status).toBe(403);
    expect((await close(id, {}, stranger)).status).toBe(403);
    expect((await close('00000000-0000-4000-8000-000000000000')).status).toBe(404);
    expect((await close('nonsense')).status).toBe(422);
  });
});

describe('reversing a closure', () => {
  const reverse = (id: string, body: object = { reason: 'Wrong unit' }, by = manager) =>
    by.send<Closure>('POST', `/closures/${id}/reversal`, body);

  test('opens the task again and holds the unit at once, then brings the due point back', async () => {
    const task = await serviceTask();
    const { body: closure } = await close(task.id);
    await work();
    expect(await reasonsHeld()).toEqual([]);
    const { status, body } = await reverse(closure.id);
    expect(status).toBe(200);
    expect(body).toMatchObject({ reversedBy: { name: 'Ines Marlow' }, reverseReason: 'Wrong unit' });
    expect(await reasonsHeld()).toEqual(['not_assessed']);
    await work();
    expect(await reasonsHeld()).toEqual(['overdue']);
    expect(await dueAtTenths()).toBe(500);
    expect((await serviceTask()).id).toBe(task.id);
    const again = await reverse(closure.id);
    expect([again.status, code(again.body)]).toEqual([409, 'conflict']);
    expect((await close(task.id)).status).toBe(201);
  });

  test('gives up the next task of the rule when nobody has touched it, and otherwise goes on in it', async () => {
    const first = await serviceTask();
    const { body: closure } = await close(first.id);
    await work();
    const input = { unitId: unit.unitId, ruleId: unit.ruleId };
    const { body: next } = await mechanic.send<TaskPage>('POST', '/tasks', input);
    await reverse(closure.id);
    expect((await serviceTask()).id).toBe(first.id);
    expect((await mechanic.send('GET', `/tasks/${next.id}`)).body).toMatchObject({ progress: 'withdrawn' });
    const { body: second } = await close(first.id);
    const { body: begun } = await mechanic.send<TaskPage>('POST', '/tasks', input);
    await mechanic.send('PATCH', `/tasks/${begun.id}`, { started: true });
    await reverse(second.id);
    expect((await serviceTask()).id).toBe(begun.id);
  });

  test("opens a repair's defect again", async () => {
    const { body: task } = await openRepair({ holdsUnit: true });
    const { body: closure } = await close(task.id);
    await reverse(closure.id);
    expect(await reasonsHeld()).toContain('defect');
  });

  test('is for a manager of the dock, with a reason', async () => {
    const { body: closure } = await close((await serviceTask()).id);
    expect((await reverse(closure.id, { reason: 'x' }, mechanic)).status).toBe(403);
    expect(named((await reverse(closure.id, {})).body)).toEqual(['reason']);
    expect((await reverse('00000000-0000-4000-8000-000000000000')).status).toBe(404);
    const row = await database.db.selectFrom('closure').selectAll().executeTakeFirstOrThrow();
    expect(row.reversed_at).toBeNull();
  });
});
