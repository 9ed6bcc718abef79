import { URGENCIES } from '@/lib/domain/urgency';
import type { Task } from '@/lib/schemas/task';
import { urgencyWords } from './task-words';
import { TaskTable } from './TaskTable';

/** Open tasks under what each part of them asks for, the most urgent part first. */
export function TaskGroups({ tasks, mayWork }: { tasks: Task[]; mayWork: boolean }) {
  const groups = URGENCIES.map((urgency) => ({
    urgency,
    ...urgencyWords[urgency],
    own: tasks.filter((task) => task.urgency === urgency),
  }));
  return (
    <div className="grid gap-10">
      {groups
        .filter(({ own }) => own.length > 0)
        .map(({ urgency, title, lead, own }) => (
          <section key={urgency} aria-labelledby={`urgency-${urgency}`}>
            <h2 id={`urgency-${urgency}`} className="text-2xl">
              {title} <span className="numerals text-ink-soft">{own.length}</span>
            </h2>
            <p className="mb-2 text-ink-soft">{lead}</p>
            <TaskTable caption={title} tasks={own} mayWork={mayWork} />
          </section>
        ))}
    </div>
  );
}
