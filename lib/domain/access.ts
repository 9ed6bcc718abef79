/**
 * Who may do what, where. The only place that decides it; denied unless a line below allows it.
 *
 * A person works at some docks, or at all of them when their list is empty. An act on a unit, task or outing
 * asks about the dock it is at; an act on what the whole fleet shares (rules, models, docks, people) asks for
 * somebody who works at all docks.
 */
export type Role = 'manager' | 'mechanic' | 'dock';

export type PersonActor = {
  kind: 'person';
  personId: string;
  sessionId: string | null;
  name: string;
  email: string;
  role: Role;
  /** Empty: every dock. */
  dockIds: readonly string[];
};
export type SystemActor = { kind: 'system' };
export type Actor = PersonActor | SystemActor;

/** The worker and the loader of the demo act as the system. */
export const SYSTEM: SystemActor = { kind: 'system' };

/** Who is written down as having done it; null for the system. */
export function personIdOf(actor: Actor): string | null {
  return actor.kind === 'person' ? actor.personId : null;
}

const EVERYONE: readonly Role[] = ['manager', 'mechanic', 'dock'];
const WORKSHOP: readonly Role[] = ['manager', 'mechanic'];
const MANAGER: readonly Role[] = ['manager'];

/** Acts at one dock: the roles that may. */
const AT_DOCK = {
  'unit.read': EVERYONE,
  'unit.write': MANAGER,
  'lay-up.write': WORKSHOP,
  'outing.write': EVERYONE,
  'reading.void': WORKSHOP,
  'reading.review': MANAGER,
  'defect.write': EVERYONE,
  'defect.clear': WORKSHOP,
  'baseline.write': WORKSHOP,
  'baseline.withdraw': MANAGER,
  'task.read': EVERYONE,
  'task.write': WORKSHOP,
  'closure.write': WORKSHOP,
  'closure.reverse': MANAGER,
  'stock.read': EVERYONE,
  'stock.write': WORKSHOP,
  'attachment.read': EVERYONE,
  'attachment.write': EVERYONE,
  'attachment.remove': WORKSHOP,
  'digest.read': MANAGER,
} as const satisfies Record<string, readonly Role[]>;

/** Acts on what all docks share: the roles that may, and whether only from a list of docks that is "all". */
const FLEET_WIDE = {
  'dock.read': { roles: EVERYONE, allDocks: false },
  'model.read': { roles: EVERYONE, allDocks: false },
  'rule.read': { roles: EVERYONE, allDocks: false },
  'procedure.read': { roles: EVERYONE, allDocks: false },
  'procedure.write': { roles: WORKSHOP, allDocks: true },
  'part.read': { roles: EVERYONE, allDocks: false },
  'part.write': { roles: WORKSHOP, allDocks: true },
  'rule.preview': { roles: EVERYONE, allDocks: false },
  'worker.read': { roles: EVERYONE, allDocks: false },
  'dock.write': { roles: MANAGER, allDocks: true },
  'model.write': { roles: MANAGER, allDocks: true },
  'rule.write': { roles: MANAGER, allDocks: true },
  'person.read': { roles: MANAGER, allDocks: true },
  'person.write': { roles: MANAGER, allDocks: true },
  'api-key.write': { roles: MANAGER, allDocks: false },
} as const satisfies Record<string, { roles: readonly Role[]; allDocks: boolean }>;

export type DockAct = keyof typeof AT_DOCK;
export type FleetAct = keyof typeof FLEET_WIDE;

/** Whether the actor may do `act` at this dock. */
export function canAtDock(actor: Actor, act: DockAct, dockId: string): boolean {
  if (actor.kind === 'system') return true;
  return canSomewhere(actor, act) && worksAt(actor, dockId);
}

/** Whether the actor may do `act` at any dock at all: what decides whether a button is shown. */
export function canSomewhere(actor: Actor, act: DockAct): boolean {
  if (actor.kind === 'system') return true;
  return (AT_DOCK[act] as readonly Role[] | undefined)?.includes(actor.role) ?? false;
}

/** Whether the actor may do `act`, which concerns all docks. */
export function canFleetWide(actor: Actor, act: FleetAct): boolean {
  if (actor.kind === 'system') return true;
  const line = FLEET_WIDE[act] as { roles: readonly Role[]; allDocks: boolean } | undefined;
  if (!line) return false;
  return line.roles.includes(actor.role) && (!line.allDocks || actor.dockIds.length === 0);
}

/** The docks whose rows the actor may see. */
export function visibleDocks(actor: Actor): 'all' | readonly string[] {
  return actor.kind === 'system' || actor.dockIds.length === 0 ? 'all' : actor.dockIds;
}

/** Whether the dock is one of those the actor works at. */
export function worksAt(actor: Actor, dockId: string): boolean {
  const docks = visibleDocks(actor);
  return docks === 'all' || docks.includes(dockId);
}
