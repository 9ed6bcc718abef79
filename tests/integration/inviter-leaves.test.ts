import { beforeEach, describe, expect, test } from 'vitest';
import { changePerson } from '@/lib/actions/change-person';
import { deactivatePerson } from '@/lib/actions/deactivate-person';
import { findInvitation } from '@/lib/actions/find-invitation';
import { invitePerson } from '@/lib/actions/invite-person';
import { listInvitations } from '@/lib/actions/list-invitations';
import { addPerson, openDock, type Member } from '../support/crew';
import { testDatabase } from '../support/database';
import { tokenInLetter } from '../support/people';
import { setEnvironment } from '../support/worker';

const database = testDatabase();
const now = new Date('2026-06-02T12:00:00Z');
const PIA = 'pia@wakewright.example';
const RAY = 'ray@wakewright.example';
let leaving: Member;
let staying: Member;
let dockId: string;

beforeEach(async () => {
  setEnvironment(database.url);
  dockId = (await openDock(database.db)).dock.id;
  [leaving, staying] = [await addPerson(database.db, 'manager'), await addPerson(database.db, 'manager')];
  await invitePerson(leaving.as(now), { email: PIA, name: 'Pia', role: 'manager' });
  await invitePerson(staying.as(now), { email: RAY, name: 'Ray', role: 'dock' });
});

/** Whether the invitation sent to this address still lets somebody in. */
const isGood = async (email: string) => {
  const token = await tokenInLetter(database.db, 'invitation', email);
  return (await findInvitation(staying.as(now), { token })) !== null;
};
const left = async () => (await listInvitations(staying.as(now))).map(({ email }) => email);

describe('the invitations of a manager of all docks', () => {
  test.each([
    ['is deactivated', (id: string) => deactivatePerson(staying.as(now), { id })],
    ['becomes a mechanic', (id: string) => changePerson(staying.as(now), { id, role: 'mechanic' })],
    ['keeps one dock only', (id: string) => changePerson(staying.as(now), { id, dockIds: [dockId] })],
  ])('who %s work no more; those of others do', async (_, lose) => {
    expect([await isGood(PIA), await isGood(RAY)]).toEqual([true, true]);
    await lose(leaving.actor.personId);
    expect([await isGood(PIA), await isGood(RAY)]).toEqual([false, true]);
    expect(await left()).toEqual([RAY]);
  });

  test('who is renamed stay good', async () => {
    await changePerson(staying.as(now), { id: leaving.actor.personId, name: 'Ada' });
    expect(await left()).toEqual([PIA, RAY]);
  });
});
