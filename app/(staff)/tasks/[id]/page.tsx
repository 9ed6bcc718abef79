import type { Metadata } from 'next';
import { cache, type ReactNode } from 'react';
import { OpenPoints } from '@/components/bench/OpenPoints';
import { SignOffs } from '@/components/bench/SignOffs';
import { WorkProvider } from '@/components/bench/WorkProvider';
import { FilesSection } from '@/components/files/FilesSection';
import { Cautions } from '@/components/task/Cautions';
import { CloseForm } from '@/components/task/CloseForm';
import { ClosuresSection, NotesSection, PlanSection, ProcedureSection } from '@/components/task/sections';
import { StartControl } from '@/components/task/StartControl';
import { TaskFacts } from '@/components/task/TaskFacts';
import { TaskPartsSection } from '@/components/task/TaskPartsSection';
import { TaskState } from '@/components/task/TaskState';
import { LinkButton } from '@/components/ui/LinkButton';
import { Notice } from '@/components/ui/Notice';
import { PageHeader } from '@/components/ui/PageHeader';
import { getTask } from '@/lib/actions/get-task';
import { getTaskParts } from '@/lib/actions/get-task-parts';
import { getWork } from '@/lib/actions/get-work';
import { listAttachments } from '@/lib/actions/list-attachments';
import { listParts } from '@/lib/actions/list-parts';
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
  const [work, files, taskParts, stock] = await Promise.all([
    getWork(ctx, task.id),
    listAttachments(ctx, { taskId: task.id }),
    getTaskParts(ctx, task.id),
    mayWork ? listParts(ctx, { limit: 500 }) : null,
  ]);
  const parts = stock?.items ?? [];
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
      <WorkProvider
        initial={work}
        me={{ id: ctx.actor.personId, name: ctx.actor.name }}
        mayWork={mayWork}
        timeZone={task.timeZone}
      >
        <div className="grid gap-10">
          <Columns>
            <div className="grid content-start gap-8">
              <TaskFacts task={task} now={now} />
              {open ? <Cautions kind={task.kind} /> : null}
              {open ? <TaskPartsSection task={taskParts} parts={parts} mayWork={mayWork} /> : null}
            </div>
            {mayWork ? (
              <div className="no-print grid content-start gap-8">
                <StartControl task={task} />
                <PlanSection task={task} />
              </div>
            ) : null}
          </Columns>
          {task.procedure ? <ProcedureSection procedure={task.procedure} open={open} /> : null}
          <Columns>
            <div className="grid content-start gap-8">
              <FilesSection
                of={{ unitId: task.unitId, taskId: task.id }}
                initial={files.items}
                me={ctx.actor.personId}
                mayAdd={may(ctx, 'attachment.write', task.dockId)}
                mayRemove={may(ctx, 'attachment.remove', task.dockId)}
              />
              <NotesSection task={task} now={now} mayWrite={may(ctx, 'task.write', task.dockId)} />
              <ClosuresSection task={task} now={now} mayReverse={may(ctx, 'closure.reverse', task.dockId)} />
            </div>
            <div className="no-print grid content-start gap-8">
              <SignOffs />
              {mayWork ? (
                <section className="grid gap-4 border-t-4 border-line bg-raised p-5" aria-labelledby="close">
                  <h2 id="close" className="text-2xl">
                    Close
                  </h2>
                  {task.procedure ? <OpenPoints /> : null}
                  <CloseForm key={task.revision} task={task} taskParts={taskParts} parts={parts} />
                </section>
              ) : null}
            </div>
          </Columns>
        </div>
      </WorkProvider>
    </>
  );
}

function Columns({ children }: { children: ReactNode }) {
  return <div className="grid gap-x-12 gap-y-8 lg:grid-cols-[3fr_2fr]">{children}</div>;
}
