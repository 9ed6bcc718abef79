import { canAtDock, canSomewhere, type Actor, type DockAct } from '@/lib/domain/access';

/** Whether to show what does `act`: at this dock, or at any where none is named. The action decides again. */
export function may({ actor }: { actor: Actor }, act: DockAct, dockId?: string): boolean {
  return dockId === undefined ? canSomewhere(actor, act) : canAtDock(actor, act, dockId);
}
