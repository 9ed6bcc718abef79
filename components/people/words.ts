import type { Role } from '@/lib/domain/access';

/** The roles as they are offered, each with what it is for. */
export const ROLE_OPTIONS: { value: Role; label: string; hint: string }[] = [
  { value: 'dock', label: 'Dock', hint: 'Checks units out and in, reports defects.' },
  { value: 'mechanic', label: 'Mechanic', hint: 'As dock, and does tasks, baselines and lay-ups.' },
  { value: 'manager', label: 'Manager', hint: 'As mechanic, and keeps units, rules, docks and people.' },
];

/** A role in one word. */
export function roleWord(role: Role): string {
  return ROLE_OPTIONS.find((option) => option.value === role)?.label ?? role;
}

export type NamedDock = { id: string; name: string };

/** The docks somebody works at, in words: "All docks" for an empty list. */
export function docksInWords(dockIds: readonly string[], docks: readonly NamedDock[]): string {
  if (dockIds.length === 0) return 'All docks';
  return docks
    .filter((dock) => dockIds.includes(dock.id))
    .map((dock) => dock.name)
    .join(', ');
}
