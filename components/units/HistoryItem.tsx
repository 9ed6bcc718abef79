import Link from 'next/link';
import { hoursText } from '@/components/rules/due-words';
import { Timestamp } from '@/components/ui/Timestamp';
import type { HistoryEntry } from '@/lib/schemas/history';
import { historyWords } from './history-words';
import { VoidReading } from './VoidReading';

/** One thing that happened to a unit, on the line of its history. */
export function HistoryItem({
  entry,
  timeZone,
  mayVoid,
}: {
  entry: HistoryEntry;
  timeZone: string;
  mayVoid: boolean;
}) {
  const { title, lines, struck } = historyWords(entry, timeZone);
  return (
    <li className="grid gap-x-6 gap-y-1 border-b border-hairline py-3 pl-4 sm:grid-cols-[13rem_minmax(0,1fr)]">
      <p className="text-ink-soft">
        <Timestamp at={entry.at} now={entry.at} timeZone={timeZone} show="absolute" />
      </p>
      <div className="grid content-start gap-1">
        <p className="font-bold">{struck ? <s>{title}</s> : title}</p>
        {lines.map((line, index) => (
          <p key={index} className="max-w-prose break-words">
            {struck ? <s>{line}</s> : line}
          </p>
        ))}
        {struck ? <p className="max-w-prose font-semibold">{struck}</p> : null}
        {entry.kind === 'closure' ? (
          <Link href={`/tasks/${entry.taskId}`} className="link inline-flex min-h-target items-center">
            Open the task
          </Link>
        ) : null}
        {mayVoid && !struck ? <Voiding entry={entry} /> : null}
      </div>
    </li>
  );
}

function Voiding({ entry }: { entry: HistoryEntry }) {
  const what = (hours: number) => `the reading of ${hoursText(hours)}`;
  switch (entry.kind) {
    case 'outing':
      return entry.readingId && entry.engineHours !== null ? (
        <div className="-ml-4">
          <VoidReading readingId={entry.readingId} what={what(entry.engineHours)} outing />
        </div>
      ) : null;
    case 'reading':
      return (
        <div className="-ml-4">
          <VoidReading readingId={entry.id} what={what(entry.shownHours)} outing={entry.outingId !== null} />
        </div>
      );
    case 'meter_swap':
      return (
        <div className="-ml-4">
          <VoidReading readingId={entry.id} what={`the meter swap at ${hoursText(entry.engineHours)}`} swap />
        </div>
      );
    default:
      return null;
  }
}
