/** The manager's weekly e-mail: what it says, worked out from facts. */
import { addDays, type CalendarDay, daysBetween, localDay } from './calendar-day';
import { computeState, type DuePoint, type Standing } from './due';
import { hasReached } from './local-time';
import { formatTenths } from './meter';
import { compareFleetNumbers } from './natural-order';
import { isOpenOn, type Opening } from './season';
import { countOf, describeDay, joinWords } from './words';

type OfUnit = { unitId: string; fleetNumber: string };

/** A unit's due points under one rule, and what it ran in the last 28 days. */
export type DutyFacts = OfUnit & {
  ruleId: string;
  ruleName: string;
  holdsUnit: boolean;
  points: readonly DuePoint[];
  standing: Standing;
  ranTenths: number;
  ranOutings: number;
};
/** Why a unit is held now, and since when. */
export type HeldFacts = OfUnit & { reasons: readonly string[]; since: Date };
/** A time in which a unit was held, from and until; null is still. They may overlap. */
export type HeldTime = OfUnit & { from: Date; until: Date | null; inServiceFrom: CalendarDay };
/** A task that was closed. */
export type ClosedFacts = OfUnit & {
  taskId: string;
  title: string;
  closedOn: CalendarDay;
  engineHoursTenths: number;
  closedBy: string | null;
};
export type DockFacts = Opening & {
  dockId: string;
  name: string;
  timeZone: string;
  today: CalendarDay;
  duties: readonly DutyFacts[];
  held: readonly HeldFacts[];
  heldTimes: readonly HeldTime[];
  closed: readonly ClosedFacts[];
};

export type OverdueLine = OfUnit & { ruleId: string; ruleName: string; holdsUnit: boolean; late: string };
/** `since` is null when the unit is not held any more. */
export type HeldLine = OfUnit & { reasons: readonly string[]; since: CalendarDay | null; daysLost: number };
export type DueLine = OfUnit & { ruleId: string; ruleName: string; when: string };
export type ClosedLine = ClosedFacts;
export type DockDigest = {
  dockId: string;
  name: string;
  overdue: OverdueLine[];
  held: HeldLine[];
  daysLost: number;
  due: DueLine[];
  closed: ClosedLine[];
};
export type DigestTotals = { overdue: number; held: number; daysLost: number; due: number; closed: number };
/** `from` and `to` are the Monday and Sunday of the week before `weekOn`. */
export type Digest = {
  weekOn: CalendarDay;
  from: CalendarDay;
  to: CalendarDay;
  docks: DockDigest[];
  totals: DigestTotals;
};

const byUnit = (a: OfUnit, b: OfUnit) => compareFleetNumbers(a.fleetNumber, b.fleetNumber);

/** The digest of the week that begins on the Monday `weekOn`. */
export function computeDigest(weekOn: CalendarDay, facts: readonly DockFacts[]): Digest {
  const docks = facts.map((dock) => computeDock(weekOn, dock));
  const sum = (count: (dock: DockDigest) => number) => docks.reduce((total, dock) => total + count(dock), 0);
  return {
    weekOn,
    from: addDays(weekOn, -7),
    to: addDays(weekOn, -1),
    docks,
    totals: {
      overdue: sum((dock) => dock.overdue.length),
      held: sum((dock) => dock.held.filter((line) => line.since !== null).length),
      daysLost: sum((dock) => dock.daysLost),
      due: sum((dock) => dock.due.length),
      closed: sum((dock) => dock.closed.length),
    },
  };
}

function computeDock(weekOn: CalendarDay, dock: DockFacts): DockDigest {
  const overdue: OverdueLine[] = [];
  const due: DueLine[] = [];
  for (const { points, standing, ranTenths, ranOutings, holdsUnit, ...duty } of dock.duties) {
    const late = describeLateness(points, standing);
    const when = late ? null : describeNext(points, standing, { ranTenths, ranOutings });
    if (late) overdue.push({ ...duty, holdsUnit, late });
    else if (when) due.push({ ...duty, when });
  }
  const lost = countDaysLost(weekOn, dock);
  const held = listHeld(dock, lost);
  return {
    dockId: dock.dockId,
    name: dock.name,
    overdue: overdue.sort((a, b) => Number(b.holdsUnit) - Number(a.holdsUnit) || byUnit(a, b)),
    held,
    daysLost: held.reduce((total, line) => total + line.daysLost, 0),
    due: due.sort(byUnit),
    closed: [...dock.closed].sort(
      (a, b) => (a.closedOn < b.closedOn ? -1 : +(a.closedOn > b.closedOn)) || byUnit(a, b),
    ),
  };
}

/**
 * How far past the end of its window a duty is, by each measure that is: 'by 12.3 h and 4 days'; null if it is not.
 * A meter that has just got there has nothing left and is past by nothing.
 */
function describeLateness(points: readonly DuePoint[], standing: Standing): string | null {
  const overdue = points.filter((point) => computeState(point, standing) === 'overdue');
  if (overdue.length === 0) return null;
  const parts = overdue.flatMap((point) => {
    switch (point.on) {
      case 'engine_hours': {
        const tenths = standing.engineHoursTenths - point.overdueFromTenths;
        return tenths > 0 ? [`${formatTenths(tenths)} h`] : [];
      }
      case 'outings': {
        const outings = standing.outings - point.overdueFromOutings;
        return outings > 0 ? [countOf(outings, 'outing')] : [];
      }
      case 'calendar':
        return [countOf(daysBetween(point.overdueFromOn, standing.today) + 1, 'day')];
    }
  });
  return parts.length > 0 ? `by ${joinWords(parts)}` : 'since its last outing';
}

type Ran = { ranTenths: number; ranOutings: number };

/**
 * When a duty is due in the next seven days, today being the first of them; null if it is not. Hours and outings
 * are set against days at the unit's pace of the last 28 days. Of several triggers the nearest is named.
 */
function describeNext(points: readonly DuePoint[], standing: Standing, ran: Ran): string | null {
  const near = points.map((point) => nextOf(point, standing, ran)).filter((next) => next.days < 7);
  near.sort((a, b) => a.days - b.days);
  return near[0]?.text ?? null;
}

function nextOf(point: DuePoint, standing: Standing, ran: Ran): { days: number; text: string } {
  switch (point.on) {
    case 'engine_hours': {
      const left = point.dueTenths - standing.engineHoursTenths;
      const late = `${formatTenths(point.overdueFromTenths - standing.engineHoursTenths)} h before it is overdue`;
      return {
        days: daysAt(left, ran.ranTenths),
        text: left > 0 ? `in ${formatTenths(left)} h` : `now; ${late}`,
      };
    }
    case 'outings': {
      const left = point.dueOutings - standing.outings;
      const late = `${countOf(point.overdueFromOutings - standing.outings, 'outing')} before it is overdue`;
      return {
        days: daysAt(left, ran.ranOutings),
        text: left > 0 ? `in ${countOf(left, 'outing')}` : `now; ${late}`,
      };
    }
    case 'calendar': {
      const days = daysBetween(standing.today, point.dueOn);
      const last = describeDay(addDays(point.overdueFromOn, -1));
      return {
        days,
        text:
          days < 0
            ? `since ${describeDay(point.dueOn)}, to be done by ${last}`
            : `on ${describeDay(point.dueOn)}`,
      };
    }
  }
}

/** Days until `left` has been run, at the pace of what was run in 28 days. */
function daysAt(left: number, ranIn28Days: number): number {
  if (left <= 0) return 0;
  return ranIn28Days > 0 ? (left * 28) / ranIn28Days : Infinity;
}

/**
 * Days of hire lost in the week before `weekOn`, by unit: the days on which the dock was open and the unit, in
 * service, was held at noon by the dock's clock. However many reasons held it, a day is one day.
 */
export function countDaysLost(
  weekOn: CalendarDay,
  dock: Opening & Pick<DockFacts, 'timeZone' | 'heldTimes'>,
): Map<string, number> {
  const { timeZone } = dock;
  const days = Array.from({ length: 7 }, (_, index) => addDays(weekOn, index - 7)).filter((day) =>
    isOpenOn(dock, day),
  );
  const lost = new Map<string, Set<CalendarDay>>();
  for (const { unitId, from, until, inServiceFrom } of dock.heldTimes) {
    const firstDay = localDay(from, timeZone);
    const firstLost = hasReached(from, firstDay, '12:01', timeZone) ? addDays(firstDay, 1) : firstDay;
    for (const day of days) {
      if (day < firstLost || day < inServiceFrom) continue;
      if (until && !hasReached(until, day, '12:01', timeZone)) continue;
      lost.set(unitId, (lost.get(unitId) ?? new Set()).add(day));
    }
  }
  return new Map([...lost].map(([unitId, set]) => [unitId, set.size]));
}

/** Units held now, and those that are not any more but lost days. */
function listHeld(dock: DockFacts, lost: ReadonlyMap<string, number>): HeldLine[] {
  const lines = new Map<string, HeldLine>();
  for (const { unitId, fleetNumber } of dock.heldTimes) {
    const daysLost = lost.get(unitId) ?? 0;
    if (daysLost > 0) lines.set(unitId, { unitId, fleetNumber, reasons: [], since: null, daysLost });
  }
  for (const { since, ...unit } of dock.held) {
    lines.set(unit.unitId, {
      ...unit,
      since: localDay(since, dock.timeZone),
      daysLost: lost.get(unit.unitId) ?? 0,
    });
  }
  return [...lines.values()].sort(
    (a, b) => Number(b.since !== null) - Number(a.since !== null) || byUnit(a, b),
  );
}
