import type { ClosedWorkRow, OpenWorkRow } from '@/db/queries/calendar';
import { addDays, localDay, type CalendarDay } from '@/lib/domain/calendar-day';
import { placeOnCalendar } from '@/lib/domain/calendar-events';
import { computeWorstState } from '@/lib/domain/due';
import { computePointStanding, findDueDay, toDuePoint, type PointStanding } from '@/lib/domain/duty-standing';
import type { CalendarDuty, CalendarEvent } from '@/lib/schemas/calendar';
import { toHours } from '@/lib/schemas/schedule-shape';

/** An open task or a duty without one as the calendar shows it, and the day it stands on, null for none. */
export function toOpenWork(row: OpenWorkRow, now: Date): { on: CalendarDay | null; duty: CalendarDuty } {
  const today = localDay(now, row.time_zone);
  const meter = { engineHoursTenths: row.engine_hours_tenths, outings: row.outing_count, today };
  const standings = row.points.map((point) => computePointStanding(toDuePoint(point), meter));
  const state = row.rule_id === null ? null : computeWorstState(standings.map((s) => s.state));
  const dueOn = findDueDay(standings.map((s) => s.point));
  const [hours, outings] = [nearest(standings, 'engine_hours'), nearest(standings, 'outings')];
  const duty: CalendarDuty = {
    id: row.task_id ?? `${row.unit_id}:${row.rule_id}`,
    kind: row.task_id ? 'task' : 'due',
    unitId: row.unit_id,
    ruleId: row.rule_id,
    taskId: row.task_id,
    title: row.title,
    state: state ?? 'open',
    dueOn,
    dueAtHours: hours?.point.on === 'engine_hours' ? toHours(hours.point.dueTenths) : null,
    dueAtOutings: outings?.point.on === 'outings' ? outings.point.dueOutings : null,
    ...spanOf(row, standings, dueOn),
    fleetNumber: row.fleet_number,
    dockId: row.dock_id,
    taskKind: row.kind,
    plannedOn: row.planned_on,
    holdsUnit: row.defect_holds === true || (row.rule_holds === true && state === 'overdue'),
    started: row.started,
    revision: row.revision,
    leftHours: hours ? toHours(hours.left) : null,
    leftOutings: outings ? outings.left : null,
  };
  return { on: placeOnCalendar({ plannedOn: row.planned_on, state, dueOn, today }), duty };
}

/** A closed task as the calendar shows it: on the day it was done. */
export function toClosedEvent(row: ClosedWorkRow): CalendarEvent {
  return {
    id: row.closure_id,
    kind: 'task',
    unitId: row.unit_id,
    ruleId: row.rule_id,
    taskId: row.task_id,
    title: row.title,
    on: row.closed_on,
    state: 'closed',
    dueOn: null,
    dueAtHours: null,
    dueAtOutings: null,
    fleetNumber: row.fleet_number,
    dockId: row.dock_id,
    taskKind: row.kind,
    plannedOn: row.planned_on,
    holdsUnit: false,
    started: true,
    revision: null,
    leftHours: null,
    leftOutings: null,
  };
}

function nearest(standings: readonly PointStanding[], on: PointStanding['point']['on']) {
  return standings
    .filter(({ point }) => point.on === on)
    .reduce<PointStanding | null>(
      (near, next) => (near === null || next.left < near.left ? next : near),
      null,
    );
}

/** The days on which a calendar duty counts as done on schedule, by the rule's window. */
function spanOf(
  row: OpenWorkRow,
  standings: readonly PointStanding[],
  dueOn: CalendarDay | null,
): Pick<CalendarDuty, 'earliest' | 'latest'> {
  const point = standings.map((s) => s.point).find((p) => p.on === 'calendar' && p.dueOn === dueOn);
  if (point?.on !== 'calendar' || !row.tolerance) return {};
  return {
    earliest: addDays(point.dueOn, -row.tolerance.earlyDays),
    latest: addDays(point.overdueFromOn, -1),
  };
}
