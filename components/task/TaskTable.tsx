import Link from 'next/link';
import { CalendarDay } from '@/components/ui/CalendarDay';
import { DataTable, type TableRow } from '@/components/ui/DataTable';
import type { Task } from '@/lib/schemas/task';
import { StartButton } from './StartButton';
import { kindWords, minutesText } from './task-words';
import { TaskState } from './TaskState';

const COLUMNS = [
  { id: 'unit', header: 'Unit', sortable: true },
  { id: 'work', header: 'Work', sortable: true },
  { id: 'state', header: 'State' },
  { id: 'planned', header: 'Planned', sortable: true },
  { id: 'takes', header: 'Takes', align: 'end' as const, sortable: true },
  { id: 'start', header: 'Who' },
];

/** Tasks in the order they are given, one row each; `mayWork` shows the button that starts one. */
export function TaskTable({ caption, tasks, mayWork }: { caption: string; tasks: Task[]; mayWork: boolean }) {
  const ended = tasks.every((task) => task.endedAt !== null);
  const columns = COLUMNS.filter(({ id }) => id !== 'start' || (mayWork && !ended));
  return <DataTable caption={caption} columns={columns} rows={tasks.map((task) => toRow(task))} />;
}

function toRow(task: Task): TableRow {
  return {
    key: task.id,
    cells: {
      unit: (
        <span className="grid">
          <span className="numerals font-bold">{task.fleetNumber}</span>
          <span className="text-ink-soft">{task.dockName}</span>
        </span>
      ),
      work: (
        <span className="grid">
          <Link
            href={`/tasks/${task.id}`}
            className="link inline-flex min-h-target items-center font-semibold sm:min-h-0"
          >
            {task.title}
          </Link>
          <span className="text-ink-soft">{kindWords[task.kind]}</span>
        </span>
      ),
      state: <TaskState task={task} />,
      planned: plannedCell(task),
      takes: task.expectedMinutes === null ? '–' : minutesText(task.expectedMinutes),
      start: <StartButton task={task} />,
    },
    sort: {
      unit: task.fleetNumber,
      work: task.title,
      planned: task.closed?.closedOn ?? task.plannedOn,
      takes: task.expectedMinutes,
    },
  };
}

function plannedCell(task: Task) {
  if (task.closed)
    return (
      <span className="grid">
        <span>
          Closed <CalendarDay date={task.closed.closedOn} />
        </span>
        <span className="text-ink-soft">
          at {task.closed.engineHours.toFixed(1)} h by {task.closed.closedBy?.name ?? 'the system'}
        </span>
      </span>
    );
  if (task.plannedOn === null) return <span className="text-ink-soft">Not planned</span>;
  return (
    <span>
      {task.plannedOn === task.today ? 'Today, ' : null}
      <CalendarDay date={task.plannedOn} />
    </span>
  );
}
