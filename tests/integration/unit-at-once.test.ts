import { randomUUID } from 'node:crypto';
import { beforeEach, expect, test } from 'vitest';
import type { Updateable } from 'kysely';
import type { UnitTable } from '@/db/tables';
import { changeUnit } from '@/lib/actions/change-unit';
import { checkOut } from '@/lib/actions/check-out';
import { addPerson, asSystem, openDock } from '../support/crew';
import { testDatabase } from '../support/database';
import { untilSomebodyWaits } from '../support/waiting';

const database = testDatabase();
const now = new Date('2026-06-02T12:00:00Z');
let unitId: string;
let north: string;
let south: string;

beforeEach(async () => {
  const opened = await openDock(database.db);
  [unitId, north] = [opened.unit.id, opened.dock.id];
  south = (await openDock(database.db, { name: 'Cais Sul', fleetNumber: 'S-1' })).dock.id;
});

/** What comes of `act`, which begins while another transaction has changed the unit but not committed yet. */
async function whileUnitIs(change: Updateable<UnitTable>, act: () => Promise<unknown>): Promise<unknown> {
  const other = await database.db.startTransaction().execute();
  await other
    .selectFrom('live_meter')
    .select('unit_id')
    .where('unit_id', '=', unitId)
    .forUpdate()
    .executeTakeFirstOrThrow();
  await other.updateTable('unit').set(change).where('id', '=', unitId).execute();
  const outcome = act().catch((refusal: unknown) => refusal);
  await untilSomebodyWaits(database.db);
  await other.commit().execute();
  return outcome;
}

const leaving = () => checkOut(asSystem(database.db, now), { id: randomUUID(), unitId });

test('a unit that is checked out while it is moved leaves from the dock it was moved to', async () => {
  expect(await whileUnitIs({ dock_id: south }, leaving)).toMatchObject({ unitId, dockId: south });
});

test('a unit that is checked out while it is moved stays with those who work at its new dock', async () => {
  const { as } = await addPerson(database.db, 'dock', [north]);
  const refused = await whileUnitIs({ dock_id: south }, () =>
    checkOut(as(now), { id: randomUUID(), unitId }),
  );
  expect(refused).toMatchObject({ code: 'forbidden', errors: [{ path: 'unitId' }] });
  expect(await database.db.selectFrom('outing').select('id').execute()).toEqual([]);
});

test('a unit that is checked out while it is retired stays ashore', async () => {
  expect(await whileUnitIs({ retired_at: now }, leaving)).toMatchObject({
    code: 'conflict',
    errors: [{ path: 'unitId' }],
  });
});

test('a unit that is changed while it is retired stays as it was', async () => {
  const rename = () => changeUnit(asSystem(database.db, now), unitId, { fleetNumber: 'N-9' });
  expect(await whileUnitIs({ retired_at: now }, rename)).toMatchObject({
    code: 'conflict',
    errors: [{ path: 'id' }],
  });
  const { fleet_number } = await database.db
    .selectFrom('unit')
    .select('fleet_number')
    .where('id', '=', unitId)
    .executeTakeFirstOrThrow();
  expect(fleet_number).toBe('N-1');
});
