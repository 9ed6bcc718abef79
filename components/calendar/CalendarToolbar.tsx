import { Button } from '@/components/ui/Button';
import { RadioGroup } from '@/components/ui/RadioGroup';
import { CALENDAR_VIEWS, type CalendarView } from '@/lib/domain/calendar-range';
import { viewWords } from './calendar-words';

/** Goes back and on, to today, and from month to week to list. */
export function CalendarToolbar({
  title,
  view,
  onStep,
  onToday,
  onView,
}: {
  title: string;
  view: CalendarView;
  onStep: (step: 1 | -1) => void;
  onToday: () => void;
  onView: (view: CalendarView) => void;
}) {
  const span = view === 'week' ? 'week' : 'month';
  return (
    <div className="mb-4 flex flex-wrap items-end justify-between gap-x-4 gap-y-2">
      <div className="flex flex-wrap items-center gap-2">
        <div className="no-print flex gap-2">
          <Button onClick={() => onStep(-1)}>
            Previous<Rest>{span}</Rest>
          </Button>
          <Button onClick={onToday}>Today</Button>
          <Button onClick={() => onStep(1)}>
            Next<Rest>{span}</Rest>
          </Button>
        </div>
        <h2 className="order-first w-full text-2xl sm:order-none sm:ml-3 sm:w-auto" aria-live="polite">
          {title}
        </h2>
      </div>
      <RadioGroup
        className="no-print"
        name="view"
        label="Show as"
        quiet
        look="segmented"
        options={CALENDAR_VIEWS.map((value) => ({ value, label: viewWords[value] }))}
        value={view}
        onChange={(event) => onView(event.target.value as CalendarView)}
      />
    </div>
  );
}

/** A word that a phone has no room for and still reads out. */
function Rest({ children }: { children: string }) {
  return <span className="sr-only sm:not-sr-only">{children}</span>;
}
