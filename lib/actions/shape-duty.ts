import type { listLastClosings } from '@/db/queries/due-points';
import type { RuleRow } from '@/db/queries/rules';
import { daysBetween } from '@/lib/domain/calendar-day';
import { computeState, computeWorstState, type DuePoint, type Standing } from '@/lib/domain/due';
import type { Left, UnitDuty } from '@/lib/schemas/due-point';
import type { Due } from '@/lib/schemas/rule';
import { fromDuePoint, toHours } from '@/lib/schemas/schedule-shape';

type LastClosing = Awaited<ReturnType<typeof listLastClosings>>[number];

/** How a unit stands under a rule, as the API and the screens show it. `points` are by trigger index. */
export function toDuty(
  rule: RuleRow,
  points: readonly (DuePoint | null)[],
  standing: Standing,
  last: LastClosing | null,
): UnitDuty {
  const triggers = rule.triggers.map((trigger, index) => {
    const point = points[index] ?? null;
    return {
      index,
      on: trigger.on,
      due: point && fromDuePoint(point),
      overdueFrom: point && overdueFrom(point),
      state: computeState(point, standing),
      left: point && leftTo(fromDuePoint(point), standing),
      leftToOverdue: point && leftTo(overdueFrom(point), standing),
    };
  });
  return {
    ruleId: rule.id,
    ruleName: rule.name,
    kind: rule.kind,
    holdsUnit: rule.holds_unit,
    state: computeWorstState(triggers.map(({ state }) => state)),
    triggers,
    lastDone: last && {
      on: last.closed_on,
      engineHours: toHours(last.engine_hours_tenths),
      outings: last.outings,
    },
  };
}

function overdueFrom(point: DuePoint): Due {
  switch (point.on) {
    case 'engine_hours':
      return { hours: toHours(point.overdueFromTenths) };
    case 'outings':
      return { outings: point.overdueFromOutings };
    case 'calendar':
      return { date: point.overdueFromOn };
  }
}

function leftTo(due: Due, { engineHoursTenths, outings, today }: Standing): Left {
  if ('date' in due) return { days: daysBetween(today, due.date) };
  if ('outings' in due) return { outings: due.outings - outings };
  return { hours: toHours(Math.round(due.hours * 10) - engineHoursTenths) };
}
