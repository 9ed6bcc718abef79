import type { PlanTask } from '@/lib/domain/workshop-cost';

/**
 * The least cost of any plan of a few tasks, by trying every order and every day of each. Written from what a plan
 * and its cost are said to be, minute by minute, and not from how they are worked out.
 */
export function cheapestPlan(minutes: number[], hire: number[], tasks: PlanTask[]): number {
  let least = Infinity;
  const starts: (number | null)[] = tasks.map(() => null);
  const orders = permutations(tasks.map((_, index) => index));
  const choose = (index: number) => {
    if (index === tasks.length) {
      for (const order of orders) least = Math.min(least, costOf(minutes, hire, tasks, order, starts));
      return;
    }
    const { from, pinned } = tasks[index]!;
    for (const day of [null, ...minutes.keys()]) {
      if (day !== null && (pinned === null ? day < from : day !== pinned)) continue;
      starts[index] = day;
      choose(index + 1);
    }
  };
  choose(0);
  return least;
}

export function permutations<T>(items: readonly T[]): T[][] {
  if (items.length === 0) return [[]];
  return items.flatMap((item, index) =>
    permutations([...items.slice(0, index), ...items.slice(index + 1)]).map((rest) => [item, ...rest]),
  );
}

function costOf(
  minutes: number[],
  hire: number[],
  tasks: PlanTask[],
  order: number[],
  starts: (number | null)[],
): number {
  const end = minutes.length;
  const free = [...minutes];
  const worked = new Map<string, Set<number>>();
  const done = new Map<number, number>();
  for (let day = 0; day < end; day += 1) {
    for (const index of order.filter((task) => starts[task] === day)) {
      if (free[day] === 0) return Infinity;
      let [at, rest] = [day, tasks[index]!.minutes];
      const days = worked.get(tasks[index]!.unitId) ?? new Set();
      worked.set(tasks[index]!.unitId, days.add(day));
      while (rest > 0) {
        if (at >= end) return Infinity;
        days.add(at);
        const step = Math.min(rest, free[at]!);
        free[at]! -= step;
        rest -= step;
        if (rest > 0) at += 1;
      }
      done.set(index, at);
    }
  }
  let [cost, mostLate] = [0, 0];
  tasks.forEach((task, index) => {
    const finished = done.get(index);
    if (finished === undefined && task.pinned !== null) cost += 10_000;
    if (finished === undefined && task.latest >= end) {
      cost += 40;
      return;
    }
    if (finished === undefined) cost += 500;
    else cost += Math.max(0, task.due - finished);
    const late = Math.max(0, (finished ?? end) - task.latest);
    mostLate = Math.max(mostLate, late);
    cost += late * (task.holds ? 100 : 10);
  });
  for (const days of worked.values()) {
    for (const day of days) cost += 20 * hire[day]! + (days.has(day - 1) ? 0 : 40);
  }
  return cost + 1000 * mostLate;
}
