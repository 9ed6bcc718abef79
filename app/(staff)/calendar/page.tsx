import type { Metadata } from 'next';
import { CalendarScreen } from '@/components/calendar/CalendarScreen';
import { EmptyState } from '@/components/ui/EmptyState';
import { PageHeader } from '@/components/ui/PageHeader';
import { openCalendar } from '@/lib/actions/open-calendar';
import { may } from '@/lib/auth/may';
import { pageContext } from '@/lib/auth/page';

export const metadata: Metadata = { title: 'Calendar' };

export default async function CalendarPage() {
  const ctx = await pageContext();
  const { docks, today, month } = await openCalendar(ctx);
  const header = (
    <PageHeader
      title="Calendar"
      lead={
        <>
          What is planned, due and done.{' '}
          <span className="max-sm:hidden">Work that is not done moves along with today.</span>
        </>
      }
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
        mayPlan={may(ctx, 'task.write')}
        initial={month}
      />
    </>
  );
}
