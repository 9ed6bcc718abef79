/** Why a unit may not be hired out, what lifts that, and how much is left before it happens. */
import { addDays } from './calendar-day';
import type { DuePoint, Standing } from './due';
import { formatTenths } from './meter';
import { countOf, describeDay } from './words';

export type HoldReason = 'overdue' | 'defect' | 'laid_up' | 'not_assessed' | 'too_little_left';

/** One reason why a unit may not be hired out now, with what its words need. */
export type Hold =
  | { reason: 'overdue'; ruleName: string; point: DuePoint; standing: Standing }
  | { reason: 'defect'; title: string }
  | { reason: 'laid_up'; note?: string | null }
  | { reason: 'not_assessed'; ruleName?: string | null }
  /** Not for every outing: fewer hours are left before a hold than are planned. */
  | { reason: 'too_little_left'; ruleName: string; leftTenths: number; plannedTenths: number };

function describeOverdue(point: DuePoint, standing: Standing): string {
  switch (point.on) {
    case 'engine_hours': {
      const late = point.overdueFromTenths - point.dueTenths;
      const allowed = late > 0 ? `, at the latest before ${formatTenths(point.overdueFromTenths)} h` : '';
      const at = formatTenths(standing.engineHoursTenths);
      return `was due at ${formatTenths(point.dueTenths)} h${allowed}; the unit has run ${at} h`;
    }
    case 'outings': {
      const late = point.overdueFromOutings - point.dueOutings;
      const allowed = late > 0 ? `, at the latest before outing ${point.overdueFromOutings}` : '';
      const made = countOf(standing.outings, 'outing');
      return `was due at outing ${point.dueOutings}${allowed}; the unit has made ${made}`;
    }
    case 'calendar': {
      const last = addDays(point.overdueFromOn, -1);
      const allowed = last > point.dueOn ? `, at the latest on ${describeDay(last)}` : '';
      return `was due on ${describeDay(point.dueOn)}${allowed}`;
    }
  }
}

/** One sentence that says why the unit is held. */
export function describeHold(hold: Hold): string {
  switch (hold.reason) {
    case 'overdue':
      return `${hold.ruleName} ${describeOverdue(hold.point, hold.standing)}.`;
    case 'defect':
      return `Defect reported: ${hold.title}.`;
    case 'laid_up':
      return hold.note ? `Laid up: ${hold.note}.` : 'Laid up.';
    case 'not_assessed':
      return hold.ruleName
        ? `Not yet assessed: the due points of ${hold.ruleName} have not been computed.`
        : 'Not yet assessed: its due points have not been computed.';
    case 'too_little_left':
      return (
        `${formatTenths(hold.leftTenths)} h are left before ${hold.ruleName} holds the unit, ` +
        `less than the ${formatTenths(hold.plannedTenths)} h planned.`
      );
  }
}

/** One sentence that says what lifts a hold. */
export function describeLift(hold: Pick<Hold, 'reason'> & { ruleName?: string | null }): string {
  switch (hold.reason) {
    case 'overdue':
      return `Lifted when a mechanic closes the task${hold.ruleName ? ` for ${hold.ruleName}` : ''}.`;
    case 'defect':
      return 'Lifted when a mechanic or manager closes its task or clears the defect.';
    case 'laid_up':
      return 'Lifted when a mechanic or manager ends the lay-up.';
    case 'not_assessed':
      return 'Lifted by the worker within seconds; if it stays, tell a manager that the worker may be down.';
    case 'too_little_left':
      return `Plan a shorter outing, or have the task${hold.ruleName ? ` for ${hold.ruleName}` : ''} closed first.`;
  }
}

/** What a unit runs in a day, for setting hours and outings against days. */
export type Pace = { tenthsPerDay: number; outingsPerDay: number };
/** Taken where nothing is known of a unit's use: five hours, or five outings, in three days. */
export const USUAL_PACE: Pace = { tenthsPerDay: 50 / 3, outingsPerDay: 5 / 3 };

/**
 * What is left before the next hold by each measure, with the rule that holds first by it; null where nothing counts
 * by it, 0 or less when the unit is held by it now. `unit_room` in SQL measures it.
 */
export type RoomByMeasure = {
  tenths: number | null;
  hoursRuleId: string | null;
  outings: number | null;
  outingsRuleId: string | null;
  days: number | null;
  daysRuleId: string | null;
};

/** The rule that holds first, hours and outings turned into days at a pace. */
export function findNearestRule(room: RoomByMeasure, pace: Pace = USUAL_PACE): string | null {
  const inDays = (left: number | null, perDay: number) =>
    left === null ? Infinity : left / Math.max(perDay, 0.01);
  const choices = [
    { days: inDays(room.tenths, pace.tenthsPerDay), ruleId: room.hoursRuleId },
    { days: inDays(room.outings, pace.outingsPerDay), ruleId: room.outingsRuleId },
    { days: inDays(room.days, 1), ruleId: room.daysRuleId },
  ];
  return choices.reduce((nearest, choice) => (choice.days < nearest.days ? choice : nearest)).ruleId;
}
