'use client';

import { Button } from '@/components/ui/Button';
import type { Task } from '@/lib/schemas/task';
import { useTaskChange } from './use-task-change';

/** Starts a task in one tap, with a way back; one that is started says by whom instead. */
export function StartButton({
  task,
  large = false,
}: {
  task: Pick<Task, 'id' | 'title' | 'fleetNumber' | 'startedBy' | 'progress'>;
  large?: boolean;
}) {
  const { busy, change } = useTaskChange(task.id);
  if (task.progress === 'started')
    return <span className="font-semibold">Started by {task.startedBy?.name ?? 'the system'}</span>;
  if (task.progress !== 'open') return null;
  return (
    <Button
      kind="primary"
      size={large ? 'large' : 'normal'}
      busy={busy}
      aria-label={`Start ${task.title} on ${task.fleetNumber}`}
      onClick={() =>
        void change({ started: true }, `${task.title} on ${task.fleetNumber} is started.`, { started: false })
      }
    >
      Start
    </Button>
  );
}
