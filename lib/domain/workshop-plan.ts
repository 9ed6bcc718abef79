/** A proposed plan for a dock's workshop, for the next two to four weeks. */
import { type Begun, computePlanCost, layOut, type PlanDays, type PlanTask } from './workshop-cost';
import {
  choicesOf,
  daySwapsOf,
  type Draft,
  type Move,
  movesOf,
  pairMovesOf,
  reinsertionsOf,
} from './workshop-moves';

/** Why a task is not in the plan. */
export type LeftOutReason = 'may_wait' | 'kits_missing' | 'pinned_day_full' | 'no_time';

export type WorkshopPlan = {
  /** In the order of work; `first` and `last` are days of the plan, `daysLate` those past its latest day. */
  planned: { taskId: string; first: number; last: number; daysLate: number }[];
  /** What cannot fit, and what may wait until after the plan. */
  leftOut: { taskId: string; reason: LeftOutReason }[];
  /** Minutes of work on each day, against those that there are. */
  load: { used: number; available: number }[];
  cost: number;
};

const MOST_ROUNDS = 60;
/** Of more tasks than these only the two best beginnings are improved, to take no longer than seconds. */
const FEW = 12;
/** Of more tasks than these no two are taken out at once. */
const FEWER = 6;

/**
 * Plans one dock's tasks at the least cost that is found; `computePlanCost` says what is weighed. Pinned tasks stay
 * where they are and the rest is planned around them. The same facts give the same plan.
 *
 * Begun from the order of earliest due dates, which alone keeps the largest lateness of one workshop least
 * (J. R. Jackson 1955), and from two other orders; then improved by moving a task, two tasks of one unit, two tasks
 * or all tasks of two days against each other, as long as that helps; up to six tasks also by taking out any two.
 * Nothing proves it best; tests hold small plans within 5 % of the best.
 */
export function planWorkshop(days: PlanDays, tasks: readonly PlanTask[]): WorkshopPlan {
  const byDue = [...tasks].sort((a, b) => a.latest - b.latest || a.due - b.due || compare(a.id, b.id));
  const byUnit = [...byDue].sort((a, b) => firstOf(byDue, a) - firstOf(byDue, b));
  const byLength = [...byDue].sort((a, b) => a.minutes - b.minutes);
  const begun = [
    ...[byDue, byUnit].map((order) => asSoonAsPossible(days, order)),
    ...[byDue, byUnit, byLength].map((order) => oneByOne(days, order)),
  ].sort((a, b) => a.cost - b.cost);
  const improved = begun
    .slice(0, tasks.length > FEW ? 2 : begun.length)
    .map((draft) => improve(days, draft))
    .sort((a, b) => a.cost - b.cost);
  const refined = improved
    .slice(0, tasks.length > FEWER ? 1 : improved.length)
    .map((draft) => refine(days, draft));
  const best = refined.reduce((a, b) => (b.cost < a.cost - 1e-9 ? b : a));
  return describePlan(days, best);
}

const compare = (a: string, b: string) => Number(a > b) - Number(a < b);
const firstOf = (order: readonly PlanTask[], { unitId }: PlanTask) =>
  order.findIndex((task) => task.unitId === unitId);

function drafted(days: PlanDays, order: readonly PlanTask[], day: ReadonlyMap<string, number | null>): Draft {
  const begun: Begun[] = [];
  const out: PlanTask[] = [];
  for (const task of order) {
    const on = day.get(task.id) ?? null;
    if (on === null) out.push(task);
    else begun.push({ task, day: on });
  }
  return { order, day, cost: computePlanCost(days, begun, out) };
}

const pinnedFirst = (order: readonly PlanTask[]) => [
  ...order.filter(({ pinned }) => pinned !== null),
  ...order.filter(({ pinned }) => pinned === null),
];

/** Each task in turn on the first day on which the plan can be laid out. */
function asSoonAsPossible(days: PlanDays, order: readonly PlanTask[]): Draft {
  const day = new Map<string, number | null>();
  const begun: Begun[] = [];
  for (const task of pinnedFirst(order)) {
    const on = choicesOf(days, task).find(
      (choice) => layOut(days, [...begun, { task, day: choice }]) !== null,
    );
    day.set(task.id, on ?? null);
    if (on !== undefined) begun.push({ task, day: on });
  }
  return drafted(days, order, day);
}

/** Each task in turn on the day that adds the least cost. */
function oneByOne(days: PlanDays, order: readonly PlanTask[]): Draft {
  let draft = drafted(days, order, new Map());
  for (const task of pinnedFirst(order)) draft = bestOf(days, draft, movesOf(days, draft, task));
  return draft;
}

function bestOf(days: PlanDays, draft: Draft, moves: readonly Move[]): Draft {
  return moves.reduce<Draft>((best, { order, day }) => {
    const next = drafted(days, order, day);
    return next.cost < best.cost - 1e-9 || !Number.isFinite(best.cost) ? next : best;
  }, draft);
}

function improve(days: PlanDays, begun: Draft): Draft {
  let draft = begun;
  for (let round = 0; round < MOST_ROUNDS; round += 1) {
    const before = draft.cost;
    for (const task of begun.order) draft = bestOf(days, draft, movesOf(days, draft, task));
    draft = overPairs(draft, (now, a, b) => bestOf(days, now, pairMovesOf(days, now, a, b)));
    draft = bestOf(days, draft, daySwapsOf(days, draft));
    if (!(draft.cost < before - 1e-9)) break;
  }
  return draft;
}

/** A last look at few tasks, any two at once; what it finds is improved in turn. */
function refine(days: PlanDays, begun: Draft): Draft {
  if (begun.order.length > FEWER) return begun;
  const found = overPairs(begun, (now, a, b) => bestOf(days, now, reinsertionsOf(days, now, a, b)));
  return found.cost < begun.cost - 1e-9 ? refine(days, improve(days, found)) : begun;
}

function overPairs(begun: Draft, change: (draft: Draft, a: PlanTask, b: PlanTask) => Draft): Draft {
  let draft = begun;
  begun.order.forEach((a, index) => {
    for (const b of begun.order.slice(index + 1)) draft = change(draft, a, b);
  });
  return draft;
}

function describePlan(days: PlanDays, draft: Draft): WorkshopPlan {
  const begun = draft.order.flatMap((task) => {
    const day = draft.day.get(task.id) ?? null;
    return day === null ? [] : [{ task, day }];
  });
  const load = days.minutes.map((available) => ({ used: 0, available }));
  const placed = layOut(days, begun) ?? [];
  for (const { task, first } of placed) {
    let rest = task.minutes;
    for (let day = first; rest > 0; day += 1) {
      const taken = Math.min(rest, load[day]!.available - load[day]!.used);
      load[day]!.used += taken;
      rest -= taken;
    }
  }
  return {
    planned: placed.map(({ task, first, last }) => {
      return { taskId: task.id, first, last, daysLate: Math.max(0, last - task.latest) };
    }),
    leftOut: draft.order
      .filter((task) => (draft.day.get(task.id) ?? null) === null)
      .map((task) => ({ taskId: task.id, reason: reasonOf(days, task) })),
    load,
    cost: draft.cost,
  };
}

function reasonOf(days: PlanDays, task: PlanTask): LeftOutReason {
  if (task.pinned !== null) return 'pinned_day_full';
  if (task.latest >= days.minutes.length) return 'may_wait';
  return task.from >= days.minutes.length ? 'kits_missing' : 'no_time';
}
