import { Timestamp } from '@/components/ui/Timestamp';
import type { TaskNote } from '@/lib/schemas/task';

/** The notes on a task as they were written. */
export function TaskNotes({ notes, timeZone, now }: { notes: TaskNote[]; timeZone: string; now: string }) {
  if (notes.length === 0) return <p className="text-ink-soft">Nobody has written anything yet.</p>;
  return (
    <ol className="grid gap-4">
      {notes.map((note) => (
        <li key={note.id} className="border-l-4 border-hairline pl-4">
          <p className="whitespace-pre-line">{note.text}</p>
          <p className="text-ink-soft">
            {note.writtenBy?.name ?? 'The system'},{' '}
            <Timestamp at={note.writtenAt} now={now} timeZone={timeZone} />
          </p>
        </li>
      ))}
    </ol>
  );
}
