import type { Metadata } from 'next';
import Link from 'next/link';
import { cache } from 'react';
import { BenchSheet } from '@/components/procedures/BenchSheet';
import { Cautions } from '@/components/task/Cautions';
import { CloseForm } from '@/components/task/CloseForm';
import { ClosureList } from '@/components/task/ClosureList';
import { NoteForm } from '@/components/task/NoteForm';
import { PlanForm } from '@/components/task/PlanForm';
import { ReasonDialog } from '@/components/task/ReasonDialog';
import { StartControl } from '@/components/task/StartControl';
import { TaskFacts } from '@/components/task/TaskFacts';
import { TaskNotes } from '@/components/task/TaskNotes';
import { TaskState } from '@/components/task/TaskState';
import { LinkButton } from '@/components/ui/LinkButton';
import { Notice } from '@/components/ui/Notice';
import { PageHeader } from '@/components/ui/PageHeader';
import { getTask } from '@/lib/actions/get-task';
import { may } from '@/lib/auth/may';
import { pageContext } from '@/lib/auth/page';
import { orNotFound, pageId } from '@/lib/auth/page-row';

type Props = { params: Promise<{ id: string }> };

const load = cache(async (id: string) => orNotFound(getTask(await pageContext(), id)));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const task = await load(await pageId(params));
  return { title: `${task.title} on ${task.fleetNumber}` };
}

export default async function TaskPage({ params }: Props) {
  const ctx = await pageContext();
  const task = await load(await pageId(params));
  const now = ctx.now.toISOString();
  const open = task.endedAt === null;
  const mayWork = open && may(ctx, 'task.write', task.dockId);
  return (
    <>
      <PageHeader
        kicker={`${task.fleetNumber} at ${task.dockName}`}
        title={task.title}
        actions={<LinkButton href="/tasks">All tasks</LinkButton>}
      >
        <TaskState task={task} />
      </PageHeader>
      {task.withdrawReason ? (
        <Notice title="Withdrawn" still>
          {task.withdrawReason}
        </Notice>
      ) : null}
      <div className="grid gap-x-12 gap-y-8 lg:grid-cols-[3fr_2fr]">
        <div className="grid content-start gap-8">
          <TaskFacts task={task} now={now} />
          {open ? <Cautions kind={task.kind} /> : null}
          {task.procedure ? (
            <section className="grid gap-2" aria-labelledby="procedure">
              <h2 id="procedure" className="text-2xl">
                Procedure
              </h2>
              <p className="text-ink-soft">
                <Link
                  href={`/procedures/${task.procedure.id}`}
                  className="link inline-flex min-h-target items-center"
                >
                  {task.procedure.name}
                </Link>
                , version {task.procedure.version}, as it stood when this task was opened.
              </p>
              <BenchSheet steps={task.procedure.steps} />
            </section>
          ) : null}
          <section className="grid gap-4" aria-labelledby="notes">
            <h2 id="notes" className="text-2xl">
              Notes
            </h2>
            <TaskNotes notes={task.notes} timeZone={task.timeZone} now={now} />
            {may(ctx, 'task.write', task.dockId) ? <NoteForm taskId={task.id} /> : null}
          </section>
          {task.closures.length > 0 ? (
            <section className="grid gap-4" aria-labelledby="closures">
              <h2 id="closures" className="text-2xl">
                {task.ruleId ? 'Done before on this unit' : 'Closings'}
              </h2>
              <ClosureList
                closures={task.closures}
                timeZone={task.timeZone}
                now={now}
                mayReverse={may(ctx, 'closure.reverse', task.dockId)}
              />
            </section>
          ) : null}
        </div>
        {mayWork ? (
          <div className="no-print grid content-start gap-8">
            <StartControl task={task} />
            <section className="grid gap-4 border-t-4 border-line bg-raised p-5" aria-labelledby="close">
              <h2 id="close" className="text-2xl">
                Close
              </h2>
              <CloseForm key={task.revision} task={task} />
            </section>
            <section className="grid gap-4" aria-labelledby="plan">
              <h2 id="plan" className="text-2xl">
                Plan
              </h2>
              <PlanForm key={task.plannedOn} task={task} />
            </section>
            {task.origin === 'rule' ? null : (
              <ReasonDialog
                path={`/api/v1/tasks/${task.id}/withdrawal`}
                button="Withdraw this task"
                title="Withdraw this task?"
              >
                <p>
                  It will not be done. {task.defectId ? 'Its defect is cleared with the same reason.' : null}
                </p>
              </ReasonDialog>
            )}
          </div>
        ) : null}
      </div>
    </>
  );
}
