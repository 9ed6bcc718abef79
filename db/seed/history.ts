import { logReading } from '@/lib/actions/log-reading';
import { recordLayUp } from '@/lib/actions/record-lay-up';
import { reviewReading } from '@/lib/actions/review-reading';
import { voidReading } from '@/lib/actions/void-reading';
import { addDays, type CalendarDay } from '@/lib/domain/calendar-day';
import type { Rule } from '@/lib/schemas/rule';
import { as, assess, bringBack, doWork, instantOf, isOverdue, openWork, sendOut, type Book } from './book';
import { careFor, newCare, type Care } from './care';
import { chanceOf } from './random';
import type { PlannedOuting } from './season';
import type { DemoUnit } from './units';

/** From how many days before the end hires have their beginning on record too, not only their return. */
const CHECKED_OUT_DAYS = 28;
const SWAP_DAYS = 120;
const LAID_UP_DAYS = 24;
/** From when on nobody looks at the safety gear of the units whose gear is to be late at the end. */
const GEAR_FORGOTTEN_DAYS = 45;

export type Course = {
  unit: DemoUnit;
  plan: readonly PlannedOuting[];
  endRule: Rule | null;
  gearRule: Rule;
  lastDay: CalendarDay;
};

/** Writes the history of one unit, day by day, through the actions. */
export async function writeHistory(book: Book, course: Course): Promise<void> {
  const { unit, lastDay, endRule } = course;
  const plan = cutPlan(course);
  const care = newCare(endRule !== null || unit.incident !== undefined);
  const closesAt = endRule && findLastClosing(book, unit, plan, endRule);
  let next = 0;
  for (let day = unit.addedOn; day <= lastDay; day = addDays(day, 1)) {
    await markDay(book, course, day, care);
    await careFor(book, care, day);
    if (endRule && closesAt !== null && !care.neglected.has(endRule.id) && closesAt(book)) {
      await closeForTheLastTime(book, endRule, day);
      care.neglected.add(endRule.id);
    }
    for (; next < plan.length && plan[next]!.on === day; next += 1) {
      const isEnding = endRule !== null && care.neglected.has(endRule.id);
      const stretch = isEnding ? findStretch(book, unit, endRule, plan.slice(next)) : 1;
      await goOut(book, care, course, plan, next, stretch);
    }
  }
}

/** A unit laid up goes out no more from then on; one whose last reading is to be high has one outing that day. */
function cutPlan({ unit, plan, lastDay }: Course): readonly PlannedOuting[] {
  const laidUpOn = addDays(lastDay, -LAID_UP_DAYS);
  if (unit.incident?.startsWith('laid-up')) return plan.filter(({ on }) => on < laidUpOn);
  if (unit.incident !== 'jump-to-review') return plan;
  const lastOn = plan.at(-1)?.on;
  return plan.slice(0, plan.findIndex(({ on }) => on === lastOn) + 1);
}

/** When the last closing of a rule has to be for the unit to stand at the end as it is meant to. */
function findLastClosing(book: Book, unit: DemoUnit, plan: readonly PlannedOuting[], rule: Rule) {
  const trigger = rule.triggers[0]!;
  if (trigger.on === 'calendar' || !unit.ending) return null;
  const { left } = unit.ending;
  if (trigger.on === 'outings') {
    const at = book.outings + plan.length - trigger.every + left;
    return ({ outings }: Book) => outings >= at;
  }
  const runs = plan.reduce((sum, { tenths }) => sum + tenths, 0);
  const at = book.engineHoursTenths + runs - trigger.every * 10 + left;
  return ({ engineHoursTenths }: Book) => engineHoursTenths >= at;
}

async function closeForTheLastTime(book: Book, rule: Rule, day: CalendarDay): Promise<void> {
  await doWork(book, rule, instantOf(book.timeZone, day, 8 * 60));
  await assess(book, instantOf(book.timeZone, day, 8 * 60 + 1));
}

/** By how much the rest of the outings has to be longer or shorter for the hours to end where they are meant to. */
function findStretch(book: Book, unit: DemoUnit, rule: Rule, rest: readonly PlannedOuting[]): number {
  const point = book.points.find((watched) => watched.rule.id === rule.id)?.point;
  if (point?.on !== 'engine_hours') return 1;
  const runs = rest.reduce((sum, { tenths }) => sum + tenths, 0);
  const wanted = point.dueTenths - unit.ending!.left - book.engineHoursTenths;
  return Math.min(1.25, Math.max(0.5, wanted / runs));
}

/** What happens to one unit alone on certain days. */
async function markDay(
  book: Book,
  { unit, lastDay, gearRule }: Course,
  day: CalendarDay,
  care: Care,
): Promise<void> {
  const at = instantOf(book.timeZone, day, 6 * 60);
  if (unit.incident === 'new-meter' && day === addDays(lastDay, -SWAP_DAYS)) {
    const oldFinal = (book.engineHoursTenths - book.baseTenths) / 10;
    const fitted = {
      id: book.chance.uuid(),
      unitId: book.unitId,
      hours: 0,
      meterSwap: { oldFinal, newFirst: 0 },
    };
    await logReading(as(book, book.crew.mechanic, at), fitted);
    book.baseTenths = book.engineHoursTenths;
    book.lastAt = at;
  }
  if (unit.incident?.startsWith('laid-up') && day === addDays(lastDay, -LAID_UP_DAYS))
    await recordLayUp(as(book, book.crew.mechanic, at), {
      unitId: book.unitId,
      fromOn: day,
      reason: unit.incident === 'laid-up' ? 'Waiting for a new hull liner' : 'Lent to the rescue training',
      ...(unit.incident === 'laid-up-until' && { untilOn: addDays(lastDay, 40) }),
    });
  if (unit.incident?.endsWith('defect') && day === addDays(lastDay, -6)) care.leavesDefects = true;
  if (unit.gearForgotten && day === addDays(lastDay, -GEAR_FORGOTTEN_DAYS)) care.neglected.add(gearRule.id);
}

/** One hire of the plan, unless the unit is held that day or it would end after the end. */
async function goOut(
  book: Book,
  care: Care,
  { unit, lastDay }: Course,
  plan: readonly PlannedOuting[],
  index: number,
  stretch: number,
): Promise<void> {
  const { on, fromMinute, minutes, ...planned } = plan[index]!;
  const from = instantOf(book.timeZone, on, fromMinute);
  const to = instantOf(book.timeZone, on, fromMinute + minutes);
  if (to > book.end || from <= book.lastAt) return;
  if (isOverdue(book, on) || book.work.some(({ defectId }) => defectId !== null)) return;
  const tenths = Math.min(Math.floor(minutes / 6), Math.round(planned.tenths * stretch));
  const isLast = plan.length - index === 1;
  if (on > addDays(lastDay, -CHECKED_OUT_DAYS)) await sendOut(book, from, to);
  const outingsLeft = plan.length - index;
  const isFirstOfDay = plan[index - 1]?.on !== on;
  if (isFirstOfDay && unit.incident === 'misread' && isOnce(care, 'misread', outingsLeft < 12))
    return misread(book, to, tenths);
  if (
    isFirstOfDay &&
    unit.incident === 'jump-to-review' &&
    (isLast || isOnce(care, 'jump', outingsLeft < 50))
  )
    return jump(book, to, isLast);
  const defect = chooseDefect(book, unit, isLast, outingsLeft);
  await bringBack(book, to, { tenths, ...(defect && { defect }) });
  if (defect) await openWork(book, new Date(to.getTime() + 60_000));
}

/** True the first time that `may` is. */
function isOnce({ happened }: Care, what: string, may: boolean): boolean {
  if (!may || happened.has(what)) return false;
  happened.add(what);
  return true;
}

/** A slip of the pen at the dock, put right by the mechanic half an hour later. */
async function misread(book: Book, at: Date, tenths: number): Promise<void> {
  const confirmReason = 'Read twice';
  const id = await bringBack(book, at, { tenths: tenths + 50, confirmReason });
  book.engineHoursTenths -= 50;
  const later = new Date(Math.min(at.getTime() + 1_200_000, book.end.getTime()));
  await voidReading(as(book, book.crew.mechanic, later), id, {
    reason: 'A digit was read wrong; looked at the meter again.',
    replacement: { hours: (book.engineHoursTenths - book.baseTenths) / 10 },
  });
  book.lastAt = later;
}

/** More hours than a hire usually runs, with a reason; the manager has looked at all but the last. */
async function jump(book: Book, at: Date, isLast: boolean): Promise<void> {
  const confirmReason = 'Pumped out and idled at the fuel dock for a long time';
  const id = await bringBack(book, at, { tenths: 84, confirmReason });
  if (isLast) return;
  const later = new Date(at.getTime() + 600_000);
  await reviewReading(as(book, book.crew.manager, later), id, { note: 'Asked the renter: it is right.' });
}

const SMALL = [
  ['Seat cover torn', 'Left side, a hand wide.'],
  ['Reverse lever stiff', 'Goes, but needs both hands.'],
  ['Hour meter fogged', 'Can still be read.'],
  ['Mirror loose', 'Right side.'],
] as const;
const SERIOUS = [
  ['Fuel smell in the hull', 'Strong after filling up. Not to be started.'],
  ['Steering pulls hard to the right', 'Since it touched ground near the channel mark.'],
  ['Cut-off switch does not stop the engine', 'Tried twice with the lanyard pulled.'],
] as const;

/** A fault found at the return, if any; some units are to have one open at the end. */
function chooseDefect(book: Book, unit: DemoUnit, isLast: boolean, outingsLeft: number) {
  const chance = chanceOf(`defect ${unit.fleetNumber} ${outingsLeft}`);
  const describe = (list: readonly (readonly [string, string])[], holdsUnit: boolean) => {
    const [title, detail] = chance.pick(list);
    return { title, detail, holdsUnit };
  };
  if (isLast && unit.incident === 'holding-defect') return describe(SERIOUS, true);
  if (isLast && unit.incident === 'small-defect') return describe(SMALL, false);
  if (unit.ending || outingsLeft < 25 || !chance.happens(0.008)) return null;
  return chance.happens(0.4) ? describe(SERIOUS, true) : describe(SMALL, false);
}
