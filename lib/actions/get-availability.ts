import { listDocks } from '@/db/queries/docks';
import { listReadiness } from '@/db/queries/readiness';
import type { Context } from '@/lib/context';
import { type CalendarDay, localDay } from '@/lib/domain/calendar-day';
import { compareFleetNumbers } from '@/lib/domain/natural-order';
import { refuseField } from '@/lib/errors';
import type { Availability, AvailabilityQuery } from '@/lib/schemas/availability';
import { toTenths } from '@/lib/schemas/schedule-shape';
import { docksAsked } from './docks-asked';
import { toHolds, toStanding } from './shape-readiness';

/**
 * Which units may be hired out, which are out, and which are held and why, read at this moment: no job has to have
 * run. `on` asks about a day to come, `hours` about an outing of that length. Units come in the natural order of
 * their fleet numbers. Throws `not_found` or `forbidden` on `dockId`, `invalid_input` on `on` for a day that is over
 * at every dock asked about: today's meters say nothing of it.
 */
export async function getAvailability(ctx: Context, query: AvailabilityQuery): Promise<Availability> {
  const dockIds = await docksAsked(ctx, query.dockId, 'unit.read');
  const onDay = query.on ?? null;
  if (onDay !== null) await refusePast(ctx, dockIds, onDay);
  const plannedTenths = query.hours === undefined ? null : toTenths(query.hours);
  const rows = await listReadiness(ctx.db, { dockIds }, ctx.now, onDay);
  rows.sort((a, b) => compareFleetNumbers(a.fleet_number, b.fleet_number));
  const answer: Availability = { asOf: ctx.now.toISOString(), ready: [], out: [], held: [] };
  for (const row of rows) {
    const unit = toStanding(row);
    const holds = toHolds(row, { at: ctx.now, onDay, plannedTenths });
    if (row.outing_id)
      answer.out.push({
        ...unit,
        outingId: row.outing_id,
        startedAt: row.started_at?.toISOString() ?? null,
        dueBackAt: row.due_back_at?.toISOString() ?? null,
        holds,
      });
    else if (holds.length > 0) answer.held.push({ ...unit, holds });
    else answer.ready.push(unit);
  }
  return answer;
}

async function refusePast(
  ctx: Context,
  dockIds: 'all' | readonly string[],
  onDay: CalendarDay,
): Promise<void> {
  const days = (await listDocks(ctx.db, dockIds)).map(({ time_zone }) => localDay(ctx.now, time_zone)).sort();
  if (days[0] !== undefined && onDay < days[0]) throw refuseField('on', 'is a day that is over');
}
