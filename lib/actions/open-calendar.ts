import type { Context } from '@/lib/context';
import { localDay } from '@/lib/domain/calendar-day';
import { computeRange } from '@/lib/domain/calendar-range';
import type { Calendar } from '@/lib/schemas/calendar';
import type { Dock } from '@/lib/schemas/dock';
import { getCalendar } from './get-calendar';
import { listDocks } from './list-docks';

/** What the calendar opens with: the actor's docks, today at the first of them, and this month. */
export async function openCalendar(ctx: Context): Promise<{ docks: Dock[]; today: string; month: Calendar }> {
  const docks = await listDocks(ctx);
  const today = localDay(ctx.now, docks[0]?.timeZone ?? 'UTC');
  return { docks, today, month: await getCalendar(ctx, computeRange('month', today)) };
}
