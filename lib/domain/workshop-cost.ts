/**
 * What a plan of one dock's workshop is, and what it costs. Days are indices into the days of the plan.
 *
 * Work goes in the order in which it is begun, what was begun first being finished first: a task takes what is left
 * of its first day, and goes on over the following days' minutes until it is done. Its unit is in the workshop from
 * its first day to its last.
 */

/** A task to be planned. Days may lie before the plan (below 0) or after it. */
export type PlanTask = {
  id: string;
  unitId: string;
  minutes: number;
  /** The first day on which it may be begun: its window open, its kits there. */
  from: number;
  /** The day it is due on. Done earlier, life is given away. */
  due: number;
  /** The last day on which it is in time. */
  latest: number;
  /** Whether its unit is held while it is late. */
  holds: boolean;
  /** Begun on this day, whatever it costs. */
  pinned: number | null;
};

/** One dock's days: minutes that its mechanics have, and how much of the fleet is wanted for hire (0 to 1). */
export type PlanDays = { minutes: readonly number[]; hire: readonly number[] };

/** A task and the day on which it begins, in the order of work. */
export type Begun = { task: PlanTask; day: number };
/** First and last day of a task's work. */
export type Placed = { task: PlanTask; first: number; last: number };

/** What a day late, and the rest, counts. The unit is arbitrary: a day's hire of one unit at full demand is 20. */
const COST = {
  pinLost: 10_000,
  mostLate: 1_000,
  leftOut: 500,
  heldDay: 100,
  lateDay: 10,
  visit: 40,
  hireDay: 20,
  earlyDay: 1,
};

/** Lays out the work; null when a task begins on a day without a minute left, or is not done within the days. */
export function layOut({ minutes }: PlanDays, begun: readonly Begun[]): Placed[] | null {
  const left = [...minutes];
  const placed: Placed[] = [];
  const inOrder = begun
    .map((item, index) => ({ ...item, index }))
    .sort((a, b) => a.day - b.day || a.index - b.index);
  for (const { task, day } of inOrder) {
    if (!(left[day]! > 0)) return null;
    let [rest, last] = [task.minutes, day];
    for (; rest > 0; last += 1) {
      if (last >= left.length) return null;
      const taken = Math.min(rest, left[last]!);
      left[last]! -= taken;
      rest -= taken;
    }
    placed.push({ task, first: day, last: Math.max(day, last - 1) });
  }
  return placed;
}

/**
 * The cost of a plan, Infinity when it cannot be laid out. Added up are
 * - 1,000 for each day that the latest task of all is late by;
 * - for each task, 100 for each day late when it holds its unit, else 10; 1 for each day before it is due;
 * - 40 for each visit: tasks of one unit on the same day, overlapping days or days that follow are one visit;
 * - 20 × the share of the fleet that is wanted, for each day on which a unit is in the workshop;
 * - a task left out counts as done on the day after the plan, and 500 more, if its latest day is within the plan;
 *   one that may wait until after the plan costs the visit that it will take then;
 * - 10,000 for a pinned task that is left out.
 */
export function computePlanCost(
  days: PlanDays,
  begun: readonly Begun[],
  leftOut: readonly PlanTask[],
): number {
  const placed = layOut(days, begun);
  if (!placed) return Infinity;
  const end = days.minutes.length;
  let [mostLate, cost] = [0, 0];
  const finish = ({ latest, due, holds }: PlanTask, last: number) => {
    const late = Math.max(0, last - latest);
    mostLate = Math.max(mostLate, late);
    cost += late * (holds ? COST.heldDay : COST.lateDay) + Math.max(0, due - last) * COST.earlyDay;
  };
  for (const { task, last } of placed) finish(task, last);
  for (const task of leftOut) {
    if (task.pinned !== null) cost += COST.pinLost;
    if (task.latest >= end) {
      cost += COST.visit;
      continue;
    }
    finish({ ...task, due: end }, end);
    cost += COST.leftOut;
  }
  return cost + COST.mostLate * mostLate + visitCost(days, placed);
}

function visitCost({ hire }: PlanDays, placed: readonly Placed[]): number {
  const seen = [...placed].sort((a, b) => a.first - b.first || a.last - b.last);
  const until = new Map<string, number>();
  let cost = 0;
  for (const { task, first, last } of seen) {
    const before = until.get(task.unitId) ?? -Infinity;
    if (first > before + 1) cost += COST.visit;
    for (let day = Math.max(first, before + 1); day <= last; day += 1) cost += COST.hireDay * hire[day]!;
    until.set(task.unitId, Math.max(before, last));
  }
  return cost;
}
