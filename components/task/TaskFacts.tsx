import Link from 'next/link';
import { DescriptionList } from '@/components/ui/DescriptionList';
import { CalendarDay } from '@/components/ui/CalendarDay';
import { Timestamp } from '@/components/ui/Timestamp';
import type { TaskPage } from '@/lib/schemas/task';
import { kindWords, minutesText, pointText } from './task-words';

/** The unit, why the task is there and by how much, what its rule means, and who is at it. */
export function TaskFacts({ task, now }: { task: TaskPage; now: string }) {
  const stamp = (at: string) => <Timestamp at={at} now={now} timeZone={task.timeZone} />;
  const items = [
    {
      term: 'Unit',
      detail: (
        <>
          <Link href={`/units/${task.unitId}`} className="link numerals">
            {task.fleetNumber}
          </Link>
          , {task.modelName}, at {task.dockName}
        </>
      ),
    },
    {
      term: 'Meter',
      detail: (
        <>
          <span className="numerals">{task.engineHours.toFixed(1)} h</span>, {task.outings} outings; read{' '}
          {stamp(task.readAt)}
        </>
      ),
    },
    { term: 'Why', detail: <Why task={task} /> },
    ...(task.ruleWords.length > 0
      ? [{ term: 'The rule', detail: task.ruleWords.map((sentence) => <p key={sentence}>{sentence}</p>) }]
      : []),
    {
      term: 'Holds the unit',
      detail: task.holdsUnit ? task.heldSince ? <>Yes, since {stamp(task.heldSince)}</> : 'Yes' : 'No',
    },
    {
      term: 'Kind',
      detail:
        kindWords[task.kind] +
        (task.expectedMinutes === null ? '' : `, about ${minutesText(task.expectedMinutes)} of work`),
    },
    {
      term: 'Planned',
      detail: task.plannedOn ? <CalendarDay date={task.plannedOn} /> : 'On no day yet',
    },
    {
      term: 'At it',
      detail: task.startedAt ? (
        <>
          {task.startedBy?.name ?? 'The system'}, started {stamp(task.startedAt)}
        </>
      ) : (
        'Nobody has started'
      ),
    },
    { term: 'Opened', detail: stamp(task.openedAt) },
  ];
  return (
    <DescriptionList items={task.endedAt ? items.filter(({ term }) => term !== 'Holds the unit') : items} />
  );
}

function Why({ task }: { task: TaskPage }) {
  if (task.points.length > 0)
    return task.points.map((point) => <p key={`${point.on}${point.left}`}>{pointText(point)}</p>);
  if (task.origin === 'rule') return 'A rule asked for it.';
  return (
    <>
      <p>{task.origin === 'defect' ? 'A defect was reported.' : 'Somebody asked for it.'}</p>
      {task.detail ? <p className="whitespace-pre-line">{task.detail}</p> : null}
    </>
  );
}
