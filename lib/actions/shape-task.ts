import type { TaskNoteRow, TaskStandingRow } from '@/db/queries/tasks';
import { toHours } from '@/lib/schemas/schedule-shape';
import { localDay, type CalendarDay } from '@/lib/domain/calendar-day';
import type { DuePoint } from '@/lib/domain/due';
import { computePointStanding, toDuePoint, type PointStanding } from '@/lib/domain/duty-standing';
import { computeWorstState } from '@/lib/domain/due';
import { computeUrgency } from '@/lib/domain/urgency';
import type { Task, TaskDuePoint, TaskNote } from '@/lib/schemas/task';

/** A task as the API and the screens show it, as it stands at `now`. */
export function toTask(row: TaskStandingRow, now: Date): Task {
  const today = localDay(now, row.time_zone);
  const standing = computeTaskStanding(row, today);
  const open = row.ended_at === null;
  const facts = { ...standing, started: row.started_at !== null, plannedOn: row.planned_on, today };
  return {
    id: row.id,
    unitId: row.unit_id,
    fleetNumber: row.fleet_number,
    dockId: row.dock_id,
    dockName: row.dock_name,
    timeZone: row.time_zone,
    kind: row.kind,
    title: row.title,
    detail: row.detail,
    origin: row.origin,
    ruleId: row.rule_id,
    defectId: row.defect_id,
    progress: progressOf(row),
    ...standing,
    urgency: open ? computeUrgency(facts) : null,
    plannedOn: row.planned_on,
    today,
    expectedMinutes: row.expected_minutes,
    openedAt: row.opened_at.toISOString(),
    startedAt: row.started_at?.toISOString() ?? null,
    startedBy: toNamed(row.started_by, row.starter_name),
    endedAt: row.ended_at?.toISOString() ?? null,
    withdrawReason: row.withdraw_reason,
    closed: toClosed(row),
    revision: row.revision,
  };
}

/** How an open task's unit stands under its rule; one that has ended stands nowhere. */
function computeTaskStanding(
  row: TaskStandingRow,
  today: CalendarDay,
): Pick<Task, 'state' | 'holdsUnit' | 'points'> {
  if (row.ended_at !== null) return { state: null, holdsUnit: false, points: [] };
  const defectHolds = row.defect_holds === true && row.defect_cleared_at === null;
  if (row.rule_id === null) return { state: null, holdsUnit: defectHolds, points: [] };
  const meter = { engineHoursTenths: row.meter_tenths, outings: row.meter_outings, today };
  const standings = (row.points ?? []).map((point) => computePointStanding(toDuePoint(point), meter));
  const state = computeWorstState(standings.map((standing) => standing.state));
  const ruleHolds = row.rule_holds === true && row.rule_ended_at === null;
  return {
    state,
    holdsUnit: defectHolds || (ruleHolds && state === 'overdue'),
    points: standings.map(toTaskDuePoint),
  };
}

function progressOf(row: TaskStandingRow): Task['progress'] {
  if (row.ended_at === null) return row.started_at === null ? 'open' : 'started';
  return row.closure_id === null ? 'withdrawn' : 'closed';
}

function toClosed(row: TaskStandingRow): Task['closed'] {
  const { closure_id, closed_at, closed_on, closed_tenths } = row;
  if (!closure_id || !closed_at || !closed_on || closed_tenths === null) return null;
  return {
    closureId: closure_id,
    closedAt: closed_at.toISOString(),
    closedOn: closed_on,
    engineHours: toHours(closed_tenths),
    closedBy: toNamed(row.closed_by, row.closer_name),
  };
}

function toTaskDuePoint({ point, state, left, leftToOverdue }: PointStanding): TaskDuePoint {
  const scale = point.on === 'engine_hours' ? 10 : 1;
  return {
    on: point.on,
    state,
    ...dueOf(point),
    left: left / scale,
    leftToOverdue: leftToOverdue / scale,
  };
}

function dueOf(point: DuePoint): Pick<TaskDuePoint, 'dueAtHours' | 'dueAtOutings' | 'dueOn'> {
  return {
    dueAtHours: point.on === 'engine_hours' ? toHours(point.dueTenths) : null,
    dueAtOutings: point.on === 'outings' ? point.dueOutings : null,
    dueOn: point.on === 'calendar' ? point.dueOn : null,
  };
}

/** A note as the API and the screens show it. */
export function toTaskNote(row: TaskNoteRow): TaskNote {
  return {
    id: row.id,
    text: row.text,
    writtenAt: row.written_at.toISOString(),
    writtenBy: toNamed(row.written_by, row.writer_name),
  };
}

/** A person by id and name; null where it was the system. */
export function toNamed(id: string | null, name: string | null): { id: string; name: string } | null {
  return id === null ? null : { id, name: name ?? '' };
}
