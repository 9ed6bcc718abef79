'use client';

import type { EventContentArg, EventDropArg } from '@fullcalendar/core';
import dayGridPlugin from '@fullcalendar/daygrid';
import interactionPlugin from '@fullcalendar/interaction';
import listPlugin from '@fullcalendar/list';
import FullCalendar from '@fullcalendar/react';
import { useEffect, useMemo, useRef } from 'react';
import type { CalendarDay } from '@/lib/domain/calendar-day';
import type { CalendarView } from '@/lib/domain/calendar-range';
import { describeDay } from '@/lib/domain/words';
import type { CalendarEvent } from '@/lib/schemas/calendar';
import { calendarStates, toLines, type CalendarLine } from './calendar-words';
import { CalendarMark } from './CalendarMark';
import './calendar.css';

const VIEWS: Record<CalendarView, string> = { month: 'dayGridMonth', week: 'dayGridWeek', list: 'listMonth' };
const PLUGINS = [dayGridPlugin, interactionPlugin, listPlugin];

type Props = {
  view: CalendarView;
  day: CalendarDay;
  today: CalendarDay;
  events: CalendarEvent[];
  mayPlan: boolean;
  onPick: (event: CalendarEvent) => void;
  /** The event was dropped on a day. Answers whether it may stay there. */
  onDrop: (event: CalendarEvent, day: CalendarDay) => boolean;
  onDragging: (dragging: boolean) => void;
  onDay: (day: CalendarDay) => void;
};

const lineOf = (event: { extendedProps: Record<string, unknown> }) =>
  event.extendedProps.line as CalendarLine;

/** The days themselves, drawn by FullCalendar in the product's own look. */
export function CalendarGrid(props: Props) {
  const { view, day, today, events, mayPlan, onPick, onDrop, onDragging, onDay } = props;
  const grid = useRef<FullCalendar>(null);
  useEffect(() => {
    // FullCalendar flushes its own rendering, which React refuses inside an effect of the same commit.
    queueMicrotask(() => grid.current?.getApi().changeView(VIEWS[view], day));
  }, [view, day]);
  const lines = useMemo(
    () =>
      toLines(events).map((line, order) => ({
        id: line.id,
        start: line.on,
        allDay: true,
        startEditable: mayPlan && line.kind === 'event' && line.event.state !== 'closed',
        classNames: ['cal-line', `cal-${line.kind === 'event' ? line.event.state : line.state}`],
        extendedProps: { line, order },
      })),
    [events, mayPlan],
  );
  const drop = (info: EventDropArg) => {
    const line = lineOf(info.event);
    if (line.kind !== 'event' || !onDrop(line.event, info.event.startStr)) info.revert();
  };
  return (
    <div className="calendar">
      <FullCalendar
        ref={grid}
        plugins={PLUGINS}
        initialView={VIEWS[view]}
        initialDate={day}
        now={today}
        timeZone="UTC"
        locale="en-GB"
        firstDay={1}
        headerToolbar={false}
        buttonIcons={false}
        height="auto"
        events={lines}
        eventOrder="order"
        dayMaxEvents={view === 'month' ? 4 : false}
        moreLinkContent={({ num }) => `${num} more`}
        moreLinkClick={({ date }) => {
          onDay(date.toISOString().slice(0, 10));
          return 'none';
        }}
        // A link that goes nowhere may not say that it is expanded; a button may.
        moreLinkDidMount={({ el }) => el.setAttribute('role', 'button')}
        moreLinkHint={(count) => `Show ${count} more on this day`}
        dayHeaderFormat={
          view === 'week' ? { weekday: 'short', day: 'numeric', month: 'short' } : { weekday: 'short' }
        }
        listDayFormat={{ weekday: 'long', day: 'numeric', month: 'long' }}
        listDaySideFormat={false}
        eventInteractive
        eventContent={(arg) => <Line arg={arg} />}
        noEventsContent="Nothing stands on these days."
        eventClick={({ event }) => {
          const line = lineOf(event);
          if (line.kind === 'event') onPick(line.event);
          else onDay(line.on);
        }}
        eventDragStart={() => onDragging(true)}
        eventDragStop={() => onDragging(false)}
        eventDrop={drop}
      />
    </div>
  );
}

function Line({ arg }: { arg: EventContentArg }) {
  const line = lineOf(arg.event);
  if (line.kind === 'count')
    return (
      <span className="cal-text">
        <CalendarMark state={line.state} />
        <strong>
          {line.count} <span className="cal-word">{calendarStates[line.state].toLowerCase()}</span>
        </strong>
      </span>
    );
  const { event } = line;
  const hint = event.plannedOn ? `Planned for ${describeDay(event.plannedOn)}` : undefined;
  return (
    <span className="cal-text" title={hint}>
      <span className="cal-head">
        <CalendarMark state={event.state} />
        <strong className="cal-word">{calendarStates[event.state]}</strong>
        <span className="numerals">{event.fleetNumber}</span>
      </span>
      <span className="cal-title">{event.title}</span>
    </span>
  );
}
