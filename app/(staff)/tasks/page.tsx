import type { Metadata } from 'next';
import { TaskFilters } from '@/components/task/TaskFilters';
import { TaskGroups } from '@/components/task/TaskGroups';
import { TaskTable } from '@/components/task/TaskTable';
import { kindWords } from '@/components/task/task-words';
import { EmptyState } from '@/components/ui/EmptyState';
import { LinkButton } from '@/components/ui/LinkButton';
import { namedOptions } from '@/components/ui/options';
import { PageHeader } from '@/components/ui/PageHeader';
import { listDocks } from '@/lib/actions/list-docks';
import { listTasks } from '@/lib/actions/list-tasks';
import { may } from '@/lib/auth/may';
import { pageContext } from '@/lib/auth/page';
import { orNotFound } from '@/lib/auth/page-row';
import { tasksQuery } from '@/lib/schemas/task';

export const metadata: Metadata = { title: 'Tasks' };

type Query = Record<string, string | string[] | undefined>;

/** What do I do next? */
export default async function TasksPage({ searchParams }: { searchParams: Promise<Query> }) {
  const ctx = await pageContext();
  const { dock, ...rest } = await searchParams;
  const query = tasksQuery.safeParse({ ...rest, dockId: dock }).data ?? tasksQuery.parse({});
  const [docks, page] = await Promise.all([listDocks(ctx), orNotFound(listTasks(ctx, query))]);
  const mayWork = may(ctx, 'task.write');
  const filters = [
    {
      name: 'dock',
      label: 'Dock',
      all: 'All docks',
      options: namedOptions(docks),
    },
    {
      name: 'kind',
      label: 'Kind',
      all: 'All kinds',
      options: Object.entries(kindWords).map(([value, label]) => ({ value, label })),
    },
    {
      name: 'state',
      label: 'Show',
      all: 'Open tasks',
      options: [
        { value: 'closed', label: 'Ended tasks' },
        { value: 'all', label: 'All tasks' },
      ],
    },
    {
      name: 'mine',
      label: 'Whose',
      all: "Everybody's",
      options: [{ value: 'true', label: 'Started by me' }],
    },
  ];
  const next = new URLSearchParams(
    Object.entries({ ...rest, dock }).flatMap(([k, v]) => (typeof v === 'string' ? [[k, v]] : [])),
  );
  if (page.nextCursor) next.set('cursor', page.nextCursor);
  return (
    <>
      <PageHeader
        title="Tasks"
        lead={query.state === 'open' ? 'What to do next, the most urgent first.' : undefined}
        actions={mayWork ? <LinkButton href="/tasks/new">New task</LinkButton> : undefined}
      >
        <TaskFilters filters={filters} />
      </PageHeader>
      {page.items.length === 0 ? (
        <EmptyState title="No tasks here">
          {query.state === 'open'
            ? 'Nothing is due at these docks, and nobody has asked for anything. A task opens by itself when a rule comes within its lead.'
            : 'Nothing matches. Take a filter away to see more.'}
        </EmptyState>
      ) : query.state === 'open' ? (
        <TaskGroups tasks={page.items} mayWork={mayWork} />
      ) : (
        <TaskTable caption="Tasks" tasks={page.items} mayWork={mayWork} />
      )}
      {page.nextCursor ? (
        <p className="mt-6">
          <LinkButton href={`/tasks?${next}`}>More tasks</LinkButton>
        </p>
      ) : null}
    </>
  );
}
