import { StateShape } from '@/components/state/StateShape';
import type { CalendarDuty } from '@/lib/schemas/calendar';

/** The mark of a state on the calendar: those of due states, an empty berth for open work, a tick for what is done. */
export function CalendarMark({ state }: { state: CalendarDuty['state'] }) {
  return (
    <svg viewBox="0 0 20 20" className="size-3.5 shrink-0" aria-hidden="true">
      {state === 'closed' ? (
        <path d="m2 10.5 5.5 6L18 4" fill="none" stroke="currentColor" strokeWidth="3" />
      ) : state === 'open' ? (
        <path d="M2 3v14h16V3" fill="none" stroke="currentColor" strokeWidth="2.5" />
      ) : (
        <StateShape state={state} />
      )}
    </svg>
  );
}
