import type { Metadata } from 'next';
import { CalendarScreen } from '@/components/calendar/CalendarScreen';
import { EmptyState } from '@/components/ui/EmptyState';
import { PageHeader } from '@/components/ui/PageHeader';
import { getCalendar } from '@/lib/actions/get-calendar';
import { listDocks } from '@/lib/actions/list-docks';
import { pageContext } from '@/lib/auth/page';
import { canSomewhere } from '@/lib/domain/access';
import { localDay } from '@/lib/domain/calendar-day';
import { computeRange } from '@/lib/domain/calendar-range';

export const metadata: Metadata = { title: 'Calendar' };

export default async function CalendarPage() {
  const ctx = await pageContext();
  const docks = await listDocks(ctx);
  const today = localDay(ctx.now, docks[0]?.timeZone ?? 'UTC');
  const header = (
    <PageHeader
      title="Calendar"
      lead="What is planned, due and done. Work that is not done moves along with today."
    />
  );
  if (docks.length === 0)
    return (
      <>
        {header}
        <EmptyState title="No docks yet">
          Work stands at a dock. A manager adds the first one under Docks.
        </EmptyState>
      </>
    );
  return (
    <>
      {header}
      <CalendarScreen
        docks={docks.map(({ id, name }) => ({ id, name }))}
        today={today}
        mayPlan={canSomewhere(ctx.actor, 'task.write')}
        initial={await getCalendar(ctx, computeRange('month', today))}
      />
    </>
  );
}
