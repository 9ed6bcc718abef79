'use client';

import { Button } from '@/components/ui/Button';
import type { Task } from '@/lib/schemas/task';
import { StartButton } from './StartButton';
import { useTaskChange } from './use-task-change';

/** Starts a task, or says who has and lets that be taken back. */
export function StartControl({
  task,
}: {
  task: Pick<Task, 'id' | 'title' | 'fleetNumber' | 'startedBy' | 'progress'>;
}) {
  const { busy, change } = useTaskChange(task.id);
  return (
    <div className="flex flex-wrap items-center gap-3">
      <StartButton task={task} large />
      {task.progress === 'started' ? (
        <Button
          busy={busy}
          onClick={() => void change({ started: false }, 'Nobody is at it any more.', { started: true })}
        >
          Not started after all
        </Button>
      ) : null}
    </div>
  );
}
