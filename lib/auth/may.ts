import {
  canAtDock,
  canFleetWide,
  canSomewhere,
  type Actor,
  type DockAct,
  type FleetAct,
} from '@/lib/domain/access';

/** Whether to show what does `act`: at this dock, or at any where none is named. The action decides again. */
export function may({ actor }: { actor: Actor }, act: DockAct, dockId?: string): boolean {
  return dockId === undefined ? canSomewhere(actor, act) : canAtDock(actor, act, dockId);
}

/** Whether to show what does `act`, which concerns all docks. The action decides again. */
export function mayFleetWide({ actor }: { actor: Actor }, act: FleetAct): boolean {
  return canFleetWide(actor, act);
}
