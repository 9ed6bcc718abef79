import { daysBetween, weekdayOf, type CalendarDay } from '@/lib/domain/calendar-day';
import type { DuePoint } from '@/lib/domain/due';
import { assess, close, doWork, instantOf, openWork, stateOf, type Book, type Watched } from './book';
import { chanceOf } from './random';

/** Work that the mechanic leaves lying, and how the mechanic's turn at a unit is decided. */
export type Care = {
  /** Rules whose work is not done any more. */
  neglected: Set<string>;
  /** Defects that are not repaired any more. */
  leavesDefects: boolean;
  /** A unit that is looked after before anything is late. */
  prompt: boolean;
  lateSince: Map<string, CalendarDay>;
  defectSince: Map<string, CalendarDay>;
  /** What was to happen to the unit once, and has. */
  happened: Set<string>;
};

export const newCare = (prompt: boolean): Care => ({
  neglected: new Set(),
  leavesDefects: false,
  prompt,
  lateSince: new Map(),
  defectSince: new Map(),
  happened: new Set(),
});

const MORNING = 6 * 60 + 30;
const WORK_BEGINS = 7 * 60;

/** What is left to the due point as a part of the lead: 1 when it becomes upcoming, 0 when due. */
function partLeft(book: Book, point: DuePoint, today: CalendarDay): number {
  switch (point.on) {
    case 'engine_hours':
      return (
        (point.dueTenths - book.engineHoursTenths) / Math.max(1, point.dueTenths - point.upcomingFromTenths)
      );
    case 'outings':
      return (point.dueOutings - book.outings) / Math.max(1, point.dueOutings - point.upcomingFromOutings);
    case 'calendar':
      return daysBetween(today, point.dueOn) / Math.max(1, daysBetween(point.upcomingFromOn, point.dueOn));
  }
}

/** How early the mechanic is with one duty, as a part of its lead: mostly a little, sometimes too late. */
function earliness(book: Book, { rule, point }: Watched, prompt: boolean): number {
  const chance = chanceOf(`care ${book.fleetNumber} ${rule.name} ${JSON.stringify(point)}`);
  const late = chance.happens(0.12);
  return late && !prompt ? -chance.between(0, 0.5) : chance.between(0.25, 0.8);
}

/** Whether the mechanic takes a duty up this morning. */
function isTaken(book: Book, care: Care, watched: Watched, today: CalendarDay): boolean {
  if (stateOf(book, watched, today) === 'overdue') {
    const since = care.lateSince.get(watched.rule.id) ?? today;
    care.lateSince.set(watched.rule.id, since);
    return care.prompt || daysBetween(since, today) >= 2;
  }
  return partLeft(book, watched.point, today) <= earliness(book, watched, care.prompt);
}

/** The morning of a day at the dock: tasks open, and the mechanic works through what has come up. */
export async function careFor(book: Book, care: Care, today: CalendarDay): Promise<void> {
  const morning = instantOf(book.timeZone, today, MORNING);
  const works = instantOf(book.timeZone, today, WORK_BEGINS + 40);
  if (works > book.end || morning <= book.lastAt) return;
  const near = book.points.filter((watched) => stateOf(book, watched, today) !== 'clear');
  const known = new Set(book.work.map(({ ruleId }) => ruleId));
  if (near.some(({ rule }) => !known.has(rule.id))) await openWork(book, morning);
  if (weekdayOf(today) === 'SU' && !care.prompt) return;
  const cared = near.filter(({ rule }) => !care.neglected.has(rule.id));
  const rules = new Set(
    cared.filter((watched) => isTaken(book, care, watched, today)).map(({ rule }) => rule),
  );
  if (rules.size > 0) for (const { rule } of cared) if (book.chance.happens(0.6)) rules.add(rule);
  const repairs = book.work.filter((work) => isRepaired(care, work.defectId, today));
  if (rules.size === 0 && repairs.length === 0) return;
  let minute = WORK_BEGINS;
  for (const rule of rules) {
    await doWork(book, rule, instantOf(book.timeZone, today, (minute += 4)));
    care.lateSince.delete(rule.id);
  }
  for (const repair of repairs) await close(book, repair, instantOf(book.timeZone, today, (minute += 4)));
  await assess(book, instantOf(book.timeZone, today, minute + 1));
}

function isRepaired(care: Care, defectId: string | null, today: CalendarDay): boolean {
  if (defectId === null || care.leavesDefects) return false;
  const since = care.defectSince.get(defectId) ?? today;
  care.defectSince.set(defectId, since);
  return daysBetween(since, today) >= 2;
}
