import { dayText } from './time-text';

/** A calendar day `YYYY-MM-DD` with its weekday: "Thu 5 Jun 1997". It belongs to no time zone. */
export function CalendarDay({ date }: { date: string }) {
  return (
    <time dateTime={date} className="whitespace-nowrap">
      {dayText(date)}
    </time>
  );
}
