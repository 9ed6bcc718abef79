import { StateMark } from '@/components/state/StateMark';
import { Tag } from '@/components/ui/Tag';
import type { Task } from '@/lib/schemas/task';
import { stateDetail, worstPoint } from './task-words';

/** How a task stands: by how much it is past or before due, whether it holds its unit, how it ended. */
export function TaskState({ task }: { task: Task }) {
  const worst = worstPoint(task.points);
  return (
    <span className="flex flex-wrap items-center gap-2">
      {task.state && worst ? <StateMark state={task.state} detail={stateDetail(worst)} /> : null}
      {task.holdsUnit ? <StateMark state="held" plain detail="by this" /> : null}
      {task.progress === 'closed' ? <Tag tone="ok">Closed</Tag> : null}
      {task.progress === 'withdrawn' ? <Tag>Withdrawn</Tag> : null}
      {task.progress === 'started' ? <Tag tone="info">Started</Tag> : null}
      {task.state === null && task.progress === 'open' && !task.holdsUnit ? <Tag>Open</Tag> : null}
    </span>
  );
}
