/** One destination of the application shell. */
export type NavItem = { href: string; label: string; current: boolean };

/** How many destinations a phone's bottom bar holds beside "More". */
export const barSize = 3;

/** Splits the destinations into those of the bottom bar and the rest, in the order given. */
export function splitNav(nav: NavItem[]): { bar: NavItem[]; more: NavItem[] } {
  if (nav.length <= barSize + 1) return { bar: nav, more: [] };
  return { bar: nav.slice(0, barSize), more: nav.slice(barSize) };
}
