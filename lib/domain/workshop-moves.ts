/** The small changes by which a plan for the workshop is improved. */
import type { PlanDays, PlanTask } from './workshop-cost';

/** One plan while it is looked for: the day of each task, null when left out, and who goes first on one day. */
export type Draft = { order: readonly PlanTask[]; day: ReadonlyMap<string, number | null>; cost: number };

/** Days on which a task may begin: its pinned day, or any with minutes from when it may. */
export function choicesOf({ minutes }: PlanDays, task: PlanTask): number[] {
  if (task.pinned !== null) return task.pinned in minutes ? [task.pinned] : [];
  return minutes.flatMap((available, day) => (available > 0 && day >= task.from ? [day] : []));
}

/** Another order, or other days. */
export type Move = { order: readonly PlanTask[]; day: ReadonlyMap<string, number | null> };

const withDay = ({ day }: Draft, ...changes: [PlanTask, number | null][]) =>
  new Map([...day, ...changes.map(([task, on]) => [task.id, on] as const)]);

/** A task on every other day, before or after what else begins there, or left out. */
export function movesOf(days: PlanDays, draft: Draft, task: PlanTask): Move[] {
  const taken = new Set(draft.order.map((other) => (other === task ? null : draft.day.get(other.id))));
  const rest = draft.order.filter((other) => other !== task);
  const orders = [
    [task, ...rest],
    [...rest, task],
  ];
  const out = task.pinned === null ? [{ order: draft.order, day: withDay(draft, [task, null]) }] : [];
  const placed = choicesOf(days, task).flatMap((on) => {
    const day = withDay(draft, [task, on]);
    return (taken.has(on) ? orders : [draft.order]).map((order) => ({ order, day }));
  });
  return [...placed, ...out];
}

/** Two tasks change places; two of one unit begin on one day. */
export function pairMovesOf(days: PlanDays, draft: Draft, a: PlanTask, b: PlanTask): Move[] {
  if (a.pinned !== null && b.pinned !== null) return [];
  const [onA, onB] = [draft.day.get(a.id) ?? null, draft.day.get(b.id) ?? null];
  const isFree = (task: PlanTask, on: number | null) =>
    on === null ? task.pinned === null : choicesOf(days, task).includes(on);
  const swapped = draft.order.map((task) => (task === a ? b : task === b ? a : task));
  const moves: Move[] = [{ order: swapped, day: draft.day }];
  if (isFree(a, onB) && isFree(b, onA)) {
    const day = withDay(draft, [a, onB], [b, onA]);
    moves.push({ order: draft.order, day }, { order: swapped, day });
  }
  if (a.unitId !== b.unitId) return moves;
  const shared = choicesOf(days, a).filter((on) => isFree(b, on));
  return [
    ...moves,
    ...shared.flatMap((on) => {
      const day = withDay(draft, [a, on], [b, on]);
      return [draft.order, swapped].map((order) => ({ order, day }));
    }),
  ];
}

/** All that begins on one day changes places with all that begins on another. */
export function daySwapsOf(days: PlanDays, draft: Draft): Move[] {
  const used = [...new Set(draft.order.flatMap((task) => draft.day.get(task.id) ?? []))];
  return used.flatMap((one) =>
    [...days.minutes.keys()].flatMap((other) => {
      const changes = draft.order.flatMap((task): [PlanTask, number][] => {
        const on = draft.day.get(task.id);
        return on === one ? [[task, other]] : on === other ? [[task, one]] : [];
      });
      if (changes.some(([task, on]) => !choicesOf(days, task).includes(on))) return [];
      return [{ order: draft.order, day: withDay(draft, ...changes) }];
    }),
  );
}

/** Two tasks taken out and begun anew, each on any day, either first. */
export function reinsertionsOf(days: PlanDays, draft: Draft, a: PlanTask, b: PlanTask): Move[] {
  const daysFor = (task: PlanTask) => [...choicesOf(days, task), ...(task.pinned === null ? [null] : [])];
  const rest = draft.order.filter((task) => task !== a && task !== b);
  const orders = [
    [a, b, ...rest],
    [b, a, ...rest],
    [...rest, a, b],
    [...rest, b, a],
    [a, ...rest, b],
    [b, ...rest, a],
  ];
  return daysFor(a).flatMap((onA) =>
    daysFor(b).flatMap((onB) => {
      const day = withDay(draft, [a, onA], [b, onB]);
      return orders.map((order) => ({ order, day }));
    }),
  );
}
