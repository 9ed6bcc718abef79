import { addDays, numberOfDay, weekdayIndex, weekdayOf, type CalendarDay } from '@/lib/domain/calendar-day';
import { DOCKS, type DemoDock } from './docks';
import { MODELS } from './models';
import { chanceOf, countOf, type Chance } from './random';
import type { DemoUnit } from './units';

/** One hire: minutes since the dock's midnight, and what the engine ran. */
export type PlannedOuting = { on: CalendarDay; fromMinute: number; minutes: number; tenths: number };

/** Monday first: most people hire at the weekend. */
const WEEKDAY_TRAFFIC = [0.6, 0.55, 0.6, 0.75, 1, 1.8, 1.65];
/** Outings a day of an ordinary unit on an ordinary day. */
const ORDINARY = 0.42;
const OPENS = 9 * 60;
const CLOSES = 18 * 60 + 30;

/** Whether a dock hires out on a day. */
export function isOpen(dock: DemoDock, day: CalendarDay): boolean {
  const { season, openWeekdays } = dock.input;
  const monthDay = day.slice(5);
  return (
    (!season || (monthDay >= season.from && monthDay <= season.to)) &&
    (!openWeekdays || openWeekdays.includes(weekdayOf(day)))
  );
}

/** The weather of a day at a dock, as a part of the ordinary traffic: now and then it rains all day. */
function weather(dock: DemoDock, day: CalendarDay): number {
  const chance = chanceOf(`weather ${dock.letter} ${day}`);
  return chance.happens(0.14) ? 0.2 : chance.between(0.75, 1.3);
}

function traffic(dock: DemoDock, day: CalendarDay): number {
  if (!isOpen(dock, day)) return 0;
  const month = dock.months[Number(day.slice(5, 7)) - 1]!;
  return month * WEEKDAY_TRAFFIC[weekdayIndex(numberOfDay(day))]! * weather(dock, day);
}

/** The outings of a unit from one day to another that `isOver` says are over, in the order they happen. */
export function planOutings(
  unit: DemoUnit,
  from: CalendarDay,
  to: CalendarDay,
  isOver: (outing: PlannedOuting) => boolean,
): PlannedOuting[] {
  const dock = DOCKS[unit.dock]!;
  const mean = ORDINARY * MODELS[unit.model]!.popularity;
  const chance = chanceOf(`outings ${unit.fleetNumber}`);
  const plan: PlannedOuting[] = [];
  for (let day = from; day <= to; day = addDays(day, 1)) {
    const count = Math.min(4, countOf(mean * traffic(dock, day), chance));
    plan.push(...planDay(day, count, chance).filter(isOver));
  }
  return withRecentOuting(plan, dock, to, chance);
}

function planDay(on: CalendarDay, count: number, chance: Chance): PlannedOuting[] {
  const outings: PlannedOuting[] = [];
  let fromMinute = OPENS + chance.whole(0, count > 1 ? 90 : 330);
  for (let i = 0; i < count; i += 1) {
    const minutes = chance.pick([60, 60, 90, 90, 120, 120, 180]);
    if (fromMinute + minutes > CLOSES) break;
    outings.push({ on, fromMinute, minutes, tenths: Math.floor((minutes / 6) * chance.between(0.5, 0.8)) });
    fromMinute += minutes + chance.whole(20, 60);
  }
  return outings;
}

/** Everything at an open dock has been out within the last open days, so that no meter looks forgotten. */
function withRecentOuting(
  plan: PlannedOuting[],
  dock: DemoDock,
  to: CalendarDay,
  chance: Chance,
): PlannedOuting[] {
  const open = [1, 2, 3, 4, 5].map((back) => addDays(to, -back)).filter((day) => isOpen(dock, day));
  const last = plan.at(-1)?.on ?? '';
  if (open.length === 0 || last >= open.at(-1)!) return plan;
  return [...plan, ...planDay(chance.pick(open), 1, chance)];
}
