import type { Context } from '@/lib/context';
import { addDays, localDay, type CalendarDay } from '@/lib/domain/calendar-day';
import { describeDay } from '@/lib/domain/words';
import { refuseField } from '@/lib/errors';

/** How far ahead work can be planned. */
export const PLAN_AHEAD_DAYS = 730;

/** Throws `invalid_input` on `plannedOn` for a day before today at the dock, or more than 730 days after it. */
export function checkPlannedOn(ctx: Context, timeZone: string, plannedOn: CalendarDay): void {
  const today = localDay(ctx.now, timeZone);
  if (plannedOn < today) throw refuseField('plannedOn', `is before today, ${describeDay(today)} at the dock`);
  const last = addDays(today, PLAN_AHEAD_DAYS);
  if (plannedOn > last) throw refuseField('plannedOn', `is after ${describeDay(last)}: plan nearer`);
}
