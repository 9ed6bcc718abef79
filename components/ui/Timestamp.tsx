import { instantText, relativeText } from './time-text';

/**
 * An instant, with weekday, in `timeZone`. `both` (the default) writes the relative time and the absolute
 * one after it, for a phone shows no tooltip; `relative` keeps the absolute one in the tooltip. It moves
 * only when `now` does, so server and browser agree.
 */
export function Timestamp({
  at,
  now,
  timeZone,
  show = 'both',
}: {
  at: Date | string;
  now: Date | string;
  timeZone: string;
  show?: 'both' | 'relative' | 'absolute';
}) {
  const instant = new Date(at);
  const absolute = instantText(instant, timeZone);
  const relative = relativeText(instant, new Date(now));
  return (
    <time dateTime={instant.toISOString()} title={`${absolute} (${timeZone})`}>
      {show === 'absolute' ? absolute : relative}
      {show === 'both' ? <span className="text-ink-soft"> · {absolute}</span> : null}
    </time>
  );
}
