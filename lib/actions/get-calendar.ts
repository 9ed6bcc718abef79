import { getFreshAsOf, listClosedWork, listOpenWork } from '@/db/queries/calendar';
import type { Context } from '@/lib/context';
import { USUAL_PACE } from '@/lib/domain/readiness';
import type { Calendar, CalendarQuery } from '@/lib/schemas/calendar';
import { docksAsked } from './docks-asked';
import { toClosedEvent, toOpenWork } from './shape-calendar';

/** At most this many duties that go by meters, have no task yet and no day are listed: the nearest. */
export const UNDATED_LIMIT = 50;

/**
 * What stands on the calendar from one day to another, both included, at the docks the actor works at: one event for
 * each open task and duty (placed by lib/domain/calendar-events.ts) and for each task closed in those days. Work
 * without a day is in `undated`. `freshAsOf`: every fact recorded until then is in it. Throws `not_found` or
 * `forbidden` on `dockId`.
 */
export async function getCalendar(ctx: Context, query: CalendarQuery): Promise<Calendar> {
  const { from, to, dockId } = query;
  const range = { dockIds: await docksAsked(ctx, dockId, 'task.read'), from, to };
  const freshAsOf = await getFreshAsOf(ctx.db, ctx.now);
  const [open, closed] = await Promise.all([
    listOpenWork(ctx.db, range, { now: ctx.now, nearest: UNDATED_LIMIT, pace: USUAL_PACE }),
    listClosedWork(ctx.db, range),
  ]);
  const events: Calendar['events'] = closed.map(toClosedEvent);
  const undated: Calendar['undated'] = [];
  for (const row of open) {
    const { on, duty } = toOpenWork(row, ctx.now);
    if (on === null) undated.push(duty);
    else if (on >= from && on <= to) events.push({ ...duty, on });
  }
  events.sort((a, b) => compare(a.on, b.on) || compareDuties(a, b));
  undated.sort((a, b) => daysLeft(a) - daysLeft(b) || compareDuties(a, b));
  return { events, undated, freshAsOf: freshAsOf.toISOString() };
}

type Duty = Calendar['undated'][number];
const ORDER: readonly Duty['state'][] = ['overdue', 'due', 'open', 'upcoming', 'clear', 'closed'];

function compareDuties(a: Duty, b: Duty): number {
  return (
    ORDER.indexOf(a.state) - ORDER.indexOf(b.state) ||
    compare(a.fleetNumber, b.fleetNumber) ||
    compare(a.title, b.title) ||
    compare(a.id, b.id)
  );
}

/** Days until due at the usual pace; work that follows from no rule comes first. */
function daysLeft({ leftHours, leftOutings }: Duty): number {
  if (leftHours === null && leftOutings === null) return -Infinity;
  return Math.min(
    leftHours === null ? Infinity : (leftHours * 10) / USUAL_PACE.tenthsPerDay,
    leftOutings === null ? Infinity : leftOutings / USUAL_PACE.outingsPerDay,
  );
}

function compare(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}
