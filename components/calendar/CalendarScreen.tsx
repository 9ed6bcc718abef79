'use client';

import dynamic from 'next/dynamic';
import { usePathname, useRouter, useSearchParams } from 'next/navigation';
import { useEffect, useMemo, useState } from 'react';
import { TaskFilters } from '@/components/task/TaskFilters';
import { kindWords } from '@/components/task/task-words';
import { Notice } from '@/components/ui/Notice';
import { Skeleton } from '@/components/ui/Skeleton';
import { useToast } from '@/components/ui/Toast';
import { usePolled } from '@/lib/client/use-polled';
import { isCalendarDay, type CalendarDay } from '@/lib/domain/calendar-day';
import { computeRange, computeStep, type CalendarView } from '@/lib/domain/calendar-range';
import { describeDay } from '@/lib/domain/words';
import type { Calendar, CalendarDuty, CalendarEvent } from '@/lib/schemas/calendar';
import { calendarStates, viewTitle } from './calendar-words';
import { CalendarToolbar } from './CalendarToolbar';
import { DutyDialog } from './DutyDialog';
import { UndatedList } from './UndatedList';
import { usePlan } from './use-plan';

const CalendarGrid = dynamic(() => import('./CalendarGrid').then((module) => module.CalendarGrid), {
  ssr: false,
  loading: () => <Skeleton lines={12} label="The calendar is coming" />,
});

/** A change anywhere is seen within two seconds, also when a busy server takes most of one to answer. */
const POLL_MS = 1_000;
const PHONE = '(width < 40rem)';
const keyOf = ({ events, undated }: Calendar) => JSON.stringify([events, undated]);

type Dock = { id: string; name: string };

/** The calendar: what is planned, due, overdue and done, with what has no day beside it. */
export function CalendarScreen({
  docks,
  today,
  mayPlan,
  initial,
}: {
  docks: Dock[];
  today: CalendarDay;
  mayPlan: boolean;
  initial: Calendar;
}) {
  const { view, day, dock, kind, state, put } = useCalendarAddress(today);
  const { from, to } = computeRange(view, day);
  const path = `/api/v1/calendar?from=${from}&to=${to}${dock ? `&dockId=${dock}` : ''}`;
  const [dragging, setDragging] = useState(false);
  const [picked, setPicked] = useState<CalendarDuty | null>(null);
  const { data, failure, ask } = usePolled<Calendar>(path, {
    everyMs: POLL_MS,
    initial,
    keyOf,
    paused: dragging,
  });
  const plan = usePlan(() => void ask());
  const toast = useToast();
  const fits = useMemo(
    () => (duty: CalendarDuty) => (!kind || duty.taskKind === kind) && (!state || duty.state === state),
    [kind, state],
  );
  const events = useMemo(() => data.events.filter(fits), [data, fits]);
  const undated = useMemo(() => data.undated.filter(fits), [data, fits]);

  function drop(event: CalendarEvent, on: CalendarDay): boolean {
    const refusal =
      event.kind === 'due'
        ? 'A due date follows from its rule and cannot be moved. Open it to plan the work.'
        : on < today
          ? `Work cannot be planned before today, ${describeDay(today)}.`
          : null;
    if (refusal) toast({ text: refusal });
    else void plan(event, on);
    return refusal === null;
  }

  return (
    <>
      <TaskFilters filters={filtersOf(docks)} />
      {failure ? (
        <div className="mt-4">
          <Notice tone="warn" title="This may be out of date">
            {failure.detail}
          </Notice>
        </div>
      ) : null}
      <div className="mt-4 grid gap-8 sm:mt-6 xl:grid-cols-[minmax(0,1fr)_18rem]">
        <section aria-label="Calendar" className="min-w-0">
          <CalendarToolbar
            title={viewTitle(view, day, from)}
            view={view}
            onStep={(step) => put({ at: computeStep(view, day, step) })}
            onToday={() => put({ at: null })}
            onView={(next) => put({ view: next })}
          />
          <CalendarGrid
            view={view}
            day={day}
            today={today}
            events={events}
            mayPlan={mayPlan}
            onPick={setPicked}
            onDrop={drop}
            onDragging={setDragging}
            onDay={(on) => put({ view: 'list', at: on })}
          />
        </section>
        <section aria-labelledby="undated">
          <h2 id="undated" className="border-b-3 border-line pb-1 text-xl">
            Without a day
          </h2>
          <UndatedList duties={undated} mayPlan={mayPlan} onPick={setPicked} />
        </section>
      </div>
      {picked ? (
        <DutyDialog
          key={picked.id}
          duty={picked}
          dockName={docks.find(({ id }) => id === picked.dockId)?.name ?? ''}
          today={today}
          mayPlan={mayPlan}
          onPlan={(on) => {
            void plan(picked, on);
            setPicked(null);
          }}
          onClose={() => setPicked(null)}
        />
      ) : null}
    </>
  );
}

function filtersOf(docks: Dock[]) {
  const options = (words: Record<string, string>) =>
    Object.entries(words).map(([value, label]) => ({ value, label }));
  return [
    {
      name: 'dock',
      label: 'Dock',
      all: 'All docks',
      options: docks.map(({ id, name }) => ({ value: id, label: name })),
    },
    { name: 'kind', label: 'Kind', all: 'All kinds', options: options(kindWords) },
    { name: 'state', label: 'State', all: 'All states', options: options(calendarStates) },
  ];
}

/** What is shown, as it stands in the address: a month on a desk and a list on a phone unless it says otherwise. */
function useCalendarAddress(today: CalendarDay) {
  const router = useRouter();
  const path = usePathname();
  const query = useSearchParams();
  const [phone, setPhone] = useState(false);
  useEffect(() => {
    const media = window.matchMedia(PHONE);
    const look = () => setPhone(media.matches);
    look();
    media.addEventListener('change', look);
    return () => media.removeEventListener('change', look);
  }, []);
  const asked = query.get('view');
  const at = query.get('at');
  const known = asked === 'month' || asked === 'week' || asked === 'list' ? asked : null;
  function put(change: { view?: CalendarView; at?: CalendarDay | null }): void {
    const next = new URLSearchParams(query);
    for (const [name, value] of Object.entries(change)) {
      if (value) next.set(name, value);
      else next.delete(name);
    }
    router.replace(next.size > 0 ? `${path}?${next}` : path, { scroll: false });
  }
  const view: CalendarView = known ?? (phone ? 'list' : 'month');
  return {
    view,
    day: isCalendarDay(at) ? at : today,
    dock: query.get('dock') ?? '',
    kind: query.get('kind') ?? '',
    state: query.get('state') ?? '',
    put,
  };
}
