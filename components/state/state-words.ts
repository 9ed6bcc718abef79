export type UnitState = 'ready' | 'out' | 'held';
export type DueState = 'clear' | 'upcoming' | 'due' | 'overdue';

/** The one word shown for each state. */
export const stateWords: Record<UnitState | DueState, string> = {
  ready: 'Ready',
  out: 'Out',
  held: 'Held',
  clear: 'Clear',
  upcoming: 'Upcoming',
  due: 'Due',
  overdue: 'Overdue',
};
