import { createHash, randomBytes } from 'node:crypto';
import type { Kysely } from 'kysely';
import type { DB } from '@/db/tables';
import { createDock } from '@/lib/actions/create-dock';
import { createModel } from '@/lib/actions/create-model';
import { createRule } from '@/lib/actions/create-rule';
import { createUnit } from '@/lib/actions/create-unit';
import { refreshDue } from '@/lib/actions/refresh-due';
import type { Context } from '@/lib/context';
import { SYSTEM, type PersonActor, type Role } from '@/lib/domain/access';
import { createRule as createRuleInput } from '@/lib/schemas/rule';
import { hashPassword } from '@/lib/secrets/password-hash';

/** What the system is asked to do at an instant. */
export function asSystem(db: Kysely<DB>, now: Date | string): Context {
  return { db, actor: SYSTEM, now: new Date(now) };
}

/** An instant so many minutes before now: what happens over HTTP happens now. */
export const minutesAgo = (minutes: number): Date => new Date(Date.now() - minutes * 60_000);

/**
 * A dock in Lisbon with a model and a unit that entered service on 1 May 2026 at 100.0 h, through the actions and
 * assessed. With `holdsAt`, a rule holds the unit from those engine hours on.
 */
export async function openDock(
  db: Kysely<DB>,
  options: { name?: string; fleetNumber?: string; holdsAt?: number; now?: Date | string } = {},
) {
  const { name = 'Cais Norte', fleetNumber = 'N-1', now = '2026-05-02T12:00:00Z' } = options;
  const ctx = asSystem(db, now);
  const dock = await createDock(ctx, { name, timeZone: 'Europe/Lisbon', craftNumbers: 'other' });
  const model = await createModel(ctx, {
    name: `Twin of ${name}`,
    propulsion: 'jet',
    stroke: 'two',
    engines: 1,
    cylinders: 2,
    carbCount: 2,
  });
  const rule = options.holdsAt
    ? await createRule(
        ctx,
        createRuleInput.parse({
          name: `Carburettor rebuild of ${name}`,
          kind: 'rebuild',
          appliesTo: { dockIds: [dock.id] },
          triggers: [{ on: 'engine_hours', every: options.holdsAt }],
        }),
      )
    : null;
  const unit = await createUnit(ctx, {
    fleetNumber,
    modelId: model.id,
    dockId: dock.id,
    enteredServiceOn: '2026-05-01',
    engineHours: 100,
  });
  await refreshDue(ctx, { unitIds: [unit.id] });
  return { dock, model, unit, rule };
}

export type Member = { actor: PersonActor; key: string; as(now: Date): Context };

/** A person of a role, at all docks unless some are named, with an API key to call with. */
export async function addPerson(db: Kysely<DB>, role: Role, dockIds: string[] = []): Promise<Member> {
  const key = randomBytes(24).toString('base64url');
  const email = `${role}-${key.slice(0, 8).toLowerCase()}@example.test`;
  const { id } = await db
    .insertInto('person')
    .values({ email, name: `A ${role}`, role, dock_ids: dockIds, password_hash: null, deactivated_by: null })
    .returning('id')
    .executeTakeFirstOrThrow();
  await db
    .insertInto('api_key')
    .values({
      person_id: id,
      name: 'test',
      prefix: key.slice(0, 6),
      key_hash: createHash('sha256').update(key).digest(),
    })
    .execute();
  const actor: PersonActor = {
    kind: 'person',
    personId: id,
    sessionId: null,
    name: `A ${role}`,
    email,
    role,
    dockIds,
  };
  return { actor, key, as: (now) => ({ db, actor, now }) };
}

export const PASSWORD = 'a-quiet-harbour-7';

/** A person who can sign in on the page, with the e-mail address answered and PASSWORD. */
export async function addSignIn(db: Kysely<DB>, role: Role, dockIds: string[] = []): Promise<string> {
  const { actor } = await addPerson(db, role, dockIds);
  await db
    .updateTable('person')
    .set({ password_hash: await hashPassword(PASSWORD) })
    .where('id', '=', actor.personId)
    .execute();
  return actor.email;
}
