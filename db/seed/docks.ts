import type { CreateDock } from '@/lib/schemas/dock';

/** A dock of the demo, with what its traffic and its craft's numbers follow from. */
export type DemoDock = {
  /** Begins the fleet numbers of its units. */
  letter: string;
  /** Begins the registrations of its units (33 CFR 174.23). */
  state: string;
  /** How busy each month is, January first, against an ordinary day. */
  months: readonly number[];
  input: CreateDock;
};

export const OPERATOR_NAME = 'Brackenfin Watercraft Hire';

const WARM_WATER = [0.45, 0.55, 0.85, 0.95, 1, 1.25, 1.45, 1.3, 0.85, 0.7, 0.5, 0.5];
const COLD_WINTER = [0, 0, 0.3, 0.6, 0.95, 1.6, 2.1, 1.9, 1, 0.5, 0.25, 0];

/** Two docks in warm water, open all year, and one with a season: whatever the date, somebody is on the water. */
export const DOCKS: readonly DemoDock[] = [
  {
    letter: 'G',
    state: 'FL',
    months: WARM_WATER,
    input: { name: 'Gullwick Slip', timeZone: 'America/New_York' },
  },
  {
    letter: 'T',
    state: 'AL',
    months: WARM_WATER,
    input: {
      name: 'Tamberly Landing',
      timeZone: 'America/Chicago',
      openWeekdays: ['WE', 'TH', 'FR', 'SA', 'SU'],
    },
  },
  {
    letter: 'Q',
    state: 'VA',
    months: COLD_WINTER,
    input: {
      name: 'Quillan Reach',
      timeZone: 'America/New_York',
      season: { from: '03-01', to: '11-30' },
    },
  },
];
