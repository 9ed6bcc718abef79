import { beforeEach, expect, test } from 'vitest';
import { openTasks } from '@/lib/actions/open-tasks';
import { refreshDue } from '@/lib/actions/refresh-due';
import { setUp } from '@/lib/actions/set-up';
import { STARTER_PROCEDURES } from '@/lib/domain/starter/procedures';
import type { Procedure, ProcedureLine } from '@/lib/schemas/procedure';
import type { Rule } from '@/lib/schemas/rule';
import type { Task, TaskPage } from '@/lib/schemas/task';
import { asSystem, openDock } from '../support/crew';
import { testDatabase } from '../support/database';
import { testApi, type Caller } from '../support/http';

const database = testDatabase();
const api = testApi(database);
let home: Awaited<ReturnType<typeof openDock>>;
let manager: Caller;
let mechanic: Caller;
let hand: Caller;

const step = (key: string, more: object = {}) => ({ key, kind: 'check', title: `Step ${key}`, ...more });
const body = (name: string, ...steps: object[]) => ({ name, kind: 'service', steps });

beforeEach(async () => {
  home = await openDock(database.db, { holdsAt: 105 });
  manager = await api.caller('manager');
  mechanic = await api.caller('mechanic');
  hand = await api.caller('dock');
});

async function write(name: string, ...steps: object[]): Promise<Procedure> {
  const answer = await mechanic.send<Procedure>('POST', '/procedures', body(name, ...steps));
  expect(answer.status).toBe(201);
  return answer.body;
}

test('a mechanic writes a procedure; its next version says who wrote it and what for, and the first is kept', async () => {
  const first = await write('Flush', step('hose'), step('salt', { per: 'engine', required: false }));
  expect(first).toMatchObject({ name: 'Flush', version: 1, retiredAt: null });
  expect(first.steps.map(({ key, per, required }) => [key, per, required])).toEqual([
    ['hose', 'unit', true],
    ['salt', 'engine', false],
  ]);
  const second = await manager.send<Procedure>('PUT', `/procedures/${first.id}`, {
    ...body('Flush, warm', step('hose')),
    note: 'Salt is seen anyway',
    version: 1,
  });
  expect(second.body).toMatchObject({ name: 'Flush, warm', version: 2 });
  expect(second.body.versions.map(({ version, note }) => [version, note])).toEqual([
    [2, 'Salt is seen anyway'],
    [1, null],
  ]);
  const late = await mechanic.send<{ code: string; errors: { path: string }[] }>(
    'PUT',
    `/procedures/${first.id}`,
    { ...body('Flush, cold', step('hose')), version: 1 },
  );
  expect([late.status, late.body.code, late.body.errors[0]?.path]).toEqual([409, 'conflict', 'version']);
  expect((await hand.send<Procedure>('GET', `/procedures/${first.id}`)).body.name).toBe('Flush, warm');
});

test.each([
  ['steps.1.key', 'two steps of one key', [step('a'), step('a')]],
  [
    'steps.0.when',
    'a step that depends on a later one',
    [step('a', { when: [{ step: 'b', outcome: 'fail' }] }), step('b')],
  ],
  [
    'steps.1.when',
    'a step that depends on a note',
    [{ ...step('a'), kind: 'note' }, step('b', { when: [{ step: 'a', outcome: 'fail' }] })],
  ],
  ['steps.0.measures', 'a measurement that measures nothing', [{ ...step('a'), kind: 'measurement' }]],
  ['steps', 'no step', []],
  [
    'steps.0.onFail.procedureId',
    'a follow-up by a procedure that there is not',
    [
      step('a', {
        onFail: { open: 'task', title: 'Mend', procedureId: '7f0c8d1e-6a9b-4c3d-8e2f-1a2b3c4d5e6f' },
      }),
    ],
  ],
])('%s is named when there is %s, and nothing is written', async (path, _, steps) => {
  const answer = await mechanic.send<{ errors: { path: string }[] }>(
    'POST',
    '/procedures',
    body('Wrong', ...steps),
  );
  expect(answer.status).toBe(422);
  expect(answer.body.errors.map((error) => error.path)).toContain(path);
  expect((await hand.send<{ items: ProcedureLine[] }>('GET', '/procedures')).body.items).toEqual([]);
});

test('a task of a rule keeps the version that stood when it was opened', async () => {
  const procedure = await write('Rebuild', step('kit', { per: 'carb' }));
  const rule = home.rule!;
  const { revision: _, ...known } = (
    await manager.send<Rule & { revision: number }>('GET', `/rules/${rule.id}`)
  ).body;
  const { name, kind, appliesTo, triggers, lead, window, holdsUnit, labour } = known;
  const change = { name, kind, appliesTo, triggers, lead: { ...lead, hours: 50 }, window, holdsUnit, labour };
  const saved = await manager.send<Rule>('PUT', `/rules/${rule.id}`, {
    ...change,
    procedureId: procedure.id,
  });
  expect(saved.body).toMatchObject({ procedureId: procedure.id });
  await refreshDue(asSystem(database.db, new Date()), { unitIds: [home.unit.id] });
  await openTasks(asSystem(database.db, new Date()), 'all');
  const [task] = (await mechanic.send<{ items: Task[] }>('GET', '/tasks')).body.items;
  await mechanic.send('PUT', `/procedures/${procedure.id}`, body('Rebuild', step('kit'), step('test')));
  const page = (await mechanic.send<TaskPage>('GET', `/tasks/${task!.id}`)).body;
  expect(page.procedure).toMatchObject({ id: procedure.id, version: 1 });
  expect(page.procedure!.steps.map(({ key }) => key)).toEqual(['kit']);

  const retired = await mechanic.send<{ code: string; detail: string }>(
    'POST',
    `/procedures/${procedure.id}/retirement`,
  );
  expect([retired.status, retired.body.detail]).toEqual([409, expect.stringContaining(name)]);
});

test('work that no rule asks for may follow a procedure, and one retired is none', async () => {
  const procedure = await write('Flush', step('hose'));
  const task = { unitId: home.unit.id, kind: 'service', title: 'Flush it', procedureId: procedure.id };
  const opened = await mechanic.send<TaskPage>('POST', '/tasks', task);
  expect(opened.body.procedure).toMatchObject({ name: 'Flush', version: 1 });
  expect((await mechanic.send('POST', `/procedures/${procedure.id}/retirement`)).status).toBe(200);
  const refused = await mechanic.send<{ errors: { path: string }[] }>('POST', '/tasks', task);
  expect([refused.status, refused.body.errors[0]?.path]).toEqual([422, 'procedureId']);
  expect((await mechanic.send<TaskPage>('GET', `/tasks/${opened.body.id}`)).body.procedure?.name).toBe(
    'Flush',
  );
});

test('an operator begins with every starter procedure', async () => {
  await database.db.deleteFrom('operator').execute();
  await setUp(asSystem(database.db, new Date()), {
    operatorName: 'Tidewater Hire',
    dock: { name: 'Cedar Point', timeZone: 'America/New_York' },
    manager: { name: 'Ines Marlow', email: 'ines@wakewright.example', password: 'otters-under-the-jetty' },
  });
  const { items } = (await hand.send<{ items: ProcedureLine[] }>('GET', '/procedures')).body;
  expect(items.map(({ name }) => name).sort()).toEqual(STARTER_PROCEDURES.map(({ name }) => name).sort());
  expect(items.every(({ version, writtenBy }) => version === 1 && writtenBy === null)).toBe(true);
});
