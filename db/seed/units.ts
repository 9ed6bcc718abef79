import { addDays, partsOfDay, type CalendarDay } from '@/lib/domain/calendar-day';
import { DOCKS } from './docks';
import { MODELS } from './models';
import { chanceOf, type Chance } from './random';
import type { RuleKey } from './rules';

/** How a unit is to stand under a rule at the end: what is left before it is due (tenths or outings), below 0 past it. */
export type Ending = { rule: RuleKey; left: number };
/** What happens to one unit alone. */
export type Incident =
  | 'holding-defect'
  | 'small-defect'
  | 'new-meter'
  | 'misread'
  | 'jump-to-review'
  | 'laid-up'
  | 'laid-up-until';

export type DemoUnit = {
  fleetNumber: string;
  dock: number;
  model: number;
  hin: string;
  registration: string;
  enteredServiceOn: CalendarDay;
  /** When it is added to the records. */
  addedOn: CalendarDay;
  engineHoursTenths: number;
  outings: number;
  /** When its safety gear was last looked at before the records began. */
  gearSeenOn: CalendarDay;
  /** Whether the last look at it is left out. */
  gearForgotten: boolean;
  ending?: Ending;
  incident?: Incident;
};

/** How many units of each model a dock has, in the order of `MODELS`. */
const FLEETS = [
  [3, 4, 4, 3, 2, 2],
  [3, 4, 3, 3, 1, 2],
  [2, 3, 2, 2, 1, 2],
];

const LATE_ARRIVALS = new Set(['G-15', 'G-17', 'T-13', 'T-15', 'Q-11']);

/** Units that are to show something in particular at the end. Days and outings are counted from then. */
const ENDINGS: Record<string, Ending> = {
  'G-02': { rule: 'lanyard', left: -4 },
  'G-05': { rule: 'carbRebuild', left: -125 },
  'G-07': { rule: 'carbRebuild', left: -45 },
  'G-09': { rule: 'lanyard', left: 2 },
  'T-03': { rule: 'carbRebuild', left: -120 },
  'T-06': { rule: 'lanyard', left: -3 },
  'T-10': { rule: 'carbRebuild', left: 60 },
  'Q-04': { rule: 'carbRebuild', left: -115 },
  'Q-05': { rule: 'lanyard', left: -3 },
};
/** Days from the end to the day the safety gear is due. */
const GEAR_DUE: Record<string, number> = {
  'G-12': -6,
  'G-14': 0,
  'T-08': -3,
  'T-01': 9,
  'Q-02': 4,
  'Q-07': -2,
};

const INCIDENTS: Record<string, Incident> = {
  'G-04': 'holding-defect',
  'T-11': 'holding-defect',
  'G-10': 'small-defect',
  'Q-03': 'small-defect',
  'T-05': 'new-meter',
  'G-08': 'misread',
  'T-02': 'jump-to-review',
  'G-16': 'laid-up',
  'Q-09': 'laid-up-until',
};

/** The fleet as the records find it on `start`, two years before `end`. */
export function listDemoUnits(start: CalendarDay, end: CalendarDay): DemoUnit[] {
  return FLEETS.flatMap((counts, dock) => {
    const models = counts.flatMap((count, model) => Array.from({ length: count }, () => model));
    return models.map((model, index) => describeUnit({ dock, model, index, start, end }));
  });
}

type Place = { dock: number; model: number; index: number; start: CalendarDay; end: CalendarDay };

function describeUnit({ dock, model, index, start, end }: Place): DemoUnit {
  const { letter, state } = DOCKS[dock]!;
  const fleetNumber = `${letter}-${String(index + 1).padStart(2, '0')}`;
  const chance = chanceOf(`unit ${fleetNumber}`);
  const used = index % 3 !== 2 && !LATE_ARRIVALS.has(fleetNumber);
  const addedOn = LATE_ARRIVALS.has(fleetNumber) ? addDays(start, chance.whole(300, 420)) : start;
  const enteredServiceOn = used ? addDays(start, -chance.whole(220, 900)) : addedOn;
  const engineHoursTenths = used ? chance.whole(900, 4200) : 0;
  const gearDue = GEAR_DUE[fleetNumber];
  return {
    fleetNumber,
    dock,
    model,
    ...numberCraft(chance, { letter: MODELS[model]!.letter, state, dock, index, enteredServiceOn }),
    enteredServiceOn,
    addedOn,
    engineHoursTenths,
    outings: Math.round(engineHoursTenths / 11),
    gearForgotten: gearDue !== undefined,
    gearSeenOn:
      gearDue !== undefined
        ? yearsBefore(addDays(end, gearDue), gearDue > 0 ? 3 : 2)
        : used
          ? addDays(start, -chance.whole(60, 320))
          : addedOn,
    ...(ENDINGS[fleetNumber] && { ending: ENDINGS[fleetNumber] }),
    ...(INCIDENTS[fleetNumber] && { incident: INCIDENTS[fleetNumber] }),
  };
}

/** The same day of an earlier year; 29 February becomes the 28th. */
export function yearsBefore(day: CalendarDay, years: number): CalendarDay {
  const monthDay = day.endsWith('-02-29') ? '02-28' : day.slice(5);
  return `${partsOfDay(day).year - years}-${monthDay}`;
}

/** A hull number (33 CFR 181.25, of a maker who does not exist) and a registration (33 CFR 174.23). */
function numberCraft(
  chance: Chance,
  craft: { letter: string; state: string; dock: number; index: number; enteredServiceOn: CalendarDay },
): { hin: string; registration: string } {
  const { year } = partsOfDay(craft.enteredServiceOn);
  const serial = `${craft.letter}${craft.dock + 1}${String(craft.index + 1).padStart(3, '0')}`;
  const month = 'ABCDEFGHIJKL'[chance.whole(0, 11)]!;
  const hin = `9WX${serial}${month}${(year - 1) % 10}${String(year % 100).padStart(2, '0')}`;
  const letters = 'ABCDEFGHJKLMNPRSTUVWXYZ';
  const suffix = chance.pick([...letters]) + chance.pick([...letters]);
  const number = 1000 + craft.dock * 2000 + craft.index * 37 + chance.whole(0, 36);
  return { hin, registration: `${craft.state} ${number} ${suffix}` };
}
