'use client';

import Link from 'next/link';
import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { Dialog } from '@/components/ui/Dialog';
import { TextInput } from '@/components/ui/TextInput';
import { addDays, type CalendarDay } from '@/lib/domain/calendar-day';
import { describeDay } from '@/lib/domain/words';
import type { CalendarDuty } from '@/lib/schemas/calendar';
import { calendarStates, dueText, leftText } from './calendar-words';
import { CalendarMark } from './CalendarMark';

/** One duty of the calendar: how it stands, the way to its task, and its planning without dragging. */
export function DutyDialog({
  duty,
  dockName,
  today,
  mayPlan,
  onPlan,
  onClose,
}: {
  duty: CalendarDuty;
  dockName: string;
  today: CalendarDay;
  mayPlan: boolean;
  onPlan: (day: CalendarDay | null) => void;
  onClose: () => void;
}) {
  const [day, setDay] = useState(duty.plannedOn ?? '');
  const facts = [dueText(duty), leftText(duty), windowText(duty)].filter(Boolean);
  return (
    <Dialog open onClose={onClose} title={duty.title} sheet>
      <div className="grid gap-4">
        <p className={`flex items-center gap-2 font-bold ${TEXT[duty.state]}`}>
          <CalendarMark state={duty.state} />
          {calendarStates[duty.state]}
          {duty.holdsUnit ? ', holds the unit' : null}
        </p>
        <p>
          <Link href={`/units/${duty.unitId}`} className="link numerals">
            {duty.fleetNumber}
          </Link>{' '}
          at {dockName}
        </p>
        {facts.map((fact) => (
          <p key={fact}>{fact}.</p>
        ))}
        {duty.state === 'closed' ? null : (
          <p>{duty.plannedOn ? `Planned for ${describeDay(duty.plannedOn)}.` : 'Planned on no day.'}</p>
        )}
        {duty.kind === 'due' ? (
          <p className="text-ink-soft">
            The due date follows from the rule and cannot be moved. Planning it opens the task for the day you
            choose.
          </p>
        ) : null}
        {duty.taskId ? (
          <p>
            <Link
              href={`/tasks/${duty.taskId}`}
              className="link inline-flex min-h-target items-center font-semibold"
            >
              Go to the task
            </Link>
          </p>
        ) : null}
        {mayPlan && duty.state !== 'closed' ? (
          <form
            className="grid gap-3 border-t border-hairline pt-4"
            onSubmit={(event) => {
              event.preventDefault();
              if (day) onPlan(day);
            }}
          >
            <div className="flex flex-wrap items-end gap-2">
              <TextInput
                type="date"
                name="plannedOn"
                label="Plan for"
                value={day}
                min={today}
                onChange={(event) => setDay(event.target.value)}
              />
              <Button type="submit" kind="primary" disabled={!day || day === duty.plannedOn}>
                Plan
              </Button>
            </div>
            <div className="flex flex-wrap gap-2">
              <Button onClick={() => onPlan(today)}>Today</Button>
              <Button onClick={() => onPlan(addDays(today, 1))}>Tomorrow</Button>
              {duty.plannedOn ? (
                <Button kind="quiet" onClick={() => onPlan(null)}>
                  Take the plan away
                </Button>
              ) : null}
            </div>
          </form>
        ) : null}
      </div>
    </Dialog>
  );
}

function windowText({ earliest, latest, dueOn }: CalendarDuty): string {
  if (!earliest || !latest || (earliest === dueOn && latest === dueOn)) return '';
  return `On schedule from ${describeDay(earliest)} to ${describeDay(latest)}`;
}

const TEXT: Record<CalendarDuty['state'], string> = {
  overdue: 'text-overdue',
  due: 'text-due',
  upcoming: 'text-upcoming',
  clear: 'text-clear',
  open: 'text-info',
  closed: 'text-ok',
};
