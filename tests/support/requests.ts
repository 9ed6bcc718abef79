import { randomUUID } from 'node:crypto';
import { refreshDue } from '@/lib/actions/refresh-due';
import type { Role } from '@/lib/domain/access';
import { asSystem, minutesAgo, openDock } from './crew';
import type { Caller, testApi } from './http';
import type { testDatabase } from './database';

/** A request that is right, who may make it, and whether somebody of another dock is refused. */
export type RightRequest = {
  params?: Record<string, string>;
  query?: Record<string, string>;
  body?: Record<string, unknown>;
  roles: readonly Role[];
  /** It concerns a row at a dock, or what only managers of all docks may do. */
  elsewhere?: 'refused';
};

export type World = Awaited<ReturnType<typeof makeWorld>>;

/** Two docks with a unit each, and at the first one of everything that an id can name. */
export async function makeWorld(database: ReturnType<typeof testDatabase>, api: ReturnType<typeof testApi>) {
  const home = await openDock(database.db, { holdsAt: 5000 });
  const far = await openDock(database.db, { name: 'Cais Sul', fleetNumber: 'S-1' });
  const manager = await api.caller('manager', { signedIn: true });
  const mechanic = await api.caller('mechanic', { signedIn: true });
  const hand = await api.caller('dock', { signedIn: true });
  const elsewhere = await api.caller('manager', { dockIds: [far.dock.id], signedIn: true });
  const post = async (path: string, body: object) => created(manager, path, body);
  const addUnit = async (fleetNumber: string) =>
    post('/units', {
      fleetNumber,
      modelId: home.model.id,
      dockId: home.dock.id,
      enteredServiceOn: '2026-05-01',
      engineHours: 10,
    });
  const unitId = home.unit.id;
  const laidUp = await addUnit('N-2');
  const jumped = await addUnit('N-3');
  const repair = { unitId, kind: 'repair', title: 'Cracked hatch' };
  const [task, spare, done] = [
    await post('/tasks', repair),
    await post('/tasks', repair),
    await post('/tasks', repair),
  ];
  const logged = (unit: string, hours: number, more: object = {}) =>
    post('/readings', { id: randomUUID(), unitId: unit, hours, at: minutesAgo(60).toISOString(), ...more });
  const procedure = (name: string) =>
    post('/procedures', { name, kind: 'service', steps: [{ key: 'look', kind: 'check', title: 'Look' }] });
  const flush = (await procedure('Flush')).id;
  const bench = await post('/tasks', { ...repair, title: 'Flush it', procedureId: flush });
  const look = { id: randomUUID(), stepKey: 'look', value: { kind: 'check', outcome: 'fail' } };
  await post(`/tasks/${bench.id}/entries`, look);
  const signOffId = randomUUID();
  await post(`/tasks/${bench.id}/sign-offs`, { id: signOffId, kind: 'test_ride' });
  const addPart = (number: string, name: string, contents?: object[]) =>
    post('/parts', { id: randomUUID(), number, name, ...(contents && { contents }) });
  const { id: partId } = await addPart('G-1', 'Gasket');
  const { id: kitId } = await addPart('K-1', 'Carburettor kit', [{ partId, quantity: 1 }]);
  await post('/stock-moves', {
    ...{ kind: 'receive', id: randomUUID(), partId, dockId: home.dock.id, quantity: 20 },
  });
  const attachmentId = randomUUID();
  await database.db
    .insertInto('attachment')
    .values({
      ...{
        id: attachmentId,
        unit_id: unitId,
        kind: 'picture',
        name: 'hatch.jpg',
        bytes: 1,
        width: 1,
        height: 1,
      },
      ...{ content_type: 'image/jpeg', object_key: randomUUID(), thumb_key: randomUUID() },
      added_at: new Date(),
    })
    .execute();
  const outingUnit = await addUnit('N-5');
  await refreshDue(asSystem(database.db, new Date()), { unitIds: [outingUnit.id] });
  return {
    callers: { manager, mechanic, dock: hand },
    elsewhere,
    home,
    far,
    unitId,
    retireId: (await addUnit('N-4')).id,
    outingUnitId: outingUnit.id,
    reading: (await logged(unitId, 101)).id,
    toReview: (await logged(jumped.id, 400, { confirmReason: 'Towed and read twice' })).id,
    taskId: task.id,
    spareTaskId: spare.id,
    closureId: (await post(`/tasks/${done.id}/closure`, {})).id,
    closedTaskId: done.id,
    openTaskId: (await post('/tasks', repair)).id,
    defectId: (await post('/defects', { unitId, title: 'Cracked hatch', holdsUnit: false })).id,
    layUpId: (await post('/lay-ups', { unitId: laidUp.id, fromOn: '2026-06-01', reason: 'Winter' })).id,
    baselineId: (
      await post(`/units/${unitId}/baselines`, {
        ruleId: home.rule!.id,
        closedOn: '2026-05-01',
        engineHours: 90,
        note: 'The log of the owner before',
      })
    ).id,
    invitationId: (
      await post('/invitations', { name: 'Ada Reef', email: 'ada@wakewright.example', role: 'dock' })
    ).id,
    apiKeyId: (await post('/api-keys', { name: 'The till' })).id,
    procedureId: flush,
    benchTaskId: bench.id,
    signOffId,
    attachmentId,
    partId,
    kitId,
    sparePartId: (await addPart('G-2', 'Old gasket')).id,
    spareProcedureId: (await procedure('Flush twice')).id,
    personId: hand.personId,
  };
}

async function created(caller: Caller, path: string, body: object): Promise<{ id: string }> {
  const answer = await caller.send<{ id: string }>('POST', path, body);
  if (answer.status !== 201) throw new Error(`${path}: ${answer.status} ${JSON.stringify(answer.body)}`);
  return answer.body;
}
