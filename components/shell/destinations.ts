import type { Role } from '@/lib/domain/access';

/** A place in the application and its name. */
export type Destination = { href: string; label: string };

const BOARD = { href: '/board', label: 'Board' };
const AVAILABILITY = { href: '/availability', label: 'Availability' };
const CALENDAR = { href: '/calendar', label: 'Calendar' };
const TASKS = { href: '/tasks', label: 'Tasks' };
const UNITS = { href: '/units', label: 'Units' };
const RULES = { href: '/rules', label: 'Rules' };
const PROCEDURES = { href: '/procedures', label: 'Procedures' };
const PARTS = { href: '/parts', label: 'Parts' };
const ACCOUNT = { href: '/account', label: 'Account' };

/** Where each role goes, in order of weight: the first answers its first question and is its home. */
const BY_ROLE: Record<Role, Destination[]> = {
  dock: [BOARD, AVAILABILITY, UNITS, CALENDAR, TASKS, ACCOUNT],
  mechanic: [TASKS, CALENDAR, AVAILABILITY, BOARD, UNITS, PARTS, RULES, PROCEDURES, ACCOUNT],
  manager: [
    AVAILABILITY,
    CALENDAR,
    TASKS,
    BOARD,
    UNITS,
    PARTS,
    RULES,
    PROCEDURES,
    { href: '/review', label: 'Review' },
    { href: '/digest', label: 'Digest' },
    { href: '/docks', label: 'Docks' },
    { href: '/models', label: 'Models' },
    { href: '/people', label: 'People' },
    ACCOUNT,
  ],
};

/** The destinations of somebody's shell. A manager of some docks only does not keep the list of people. */
export function destinationsFor({
  role,
  dockIds,
}: {
  role: Role;
  dockIds: readonly string[];
}): Destination[] {
  const all = BY_ROLE[role];
  return dockIds.length === 0 ? all : all.filter(({ href }) => href !== '/people');
}

/** The first screen of a role: what may I launch, what do I do next, what is about to cost a day's hire. */
export function homeFor(role: Role): string {
  return BY_ROLE[role][0]?.href ?? '/account';
}

/** Whether `path` is this destination or lies below it. */
export function isAt(destination: Destination, path: string): boolean {
  return path === destination.href || path.startsWith(`${destination.href}/`);
}
