import Link from 'next/link';
import { Bench } from '@/components/bench/Bench';
import type { TaskPage } from '@/lib/schemas/task';
import { ClosureList } from './ClosureList';
import { NoteForm } from './NoteForm';
import { PlanForm } from './PlanForm';
import { ReasonDialog } from './ReasonDialog';
import { TaskNotes } from './TaskNotes';

/** The steps of the task's procedure, to be worked through while it is open. */
export function ProcedureSection({
  procedure,
  open,
}: {
  procedure: NonNullable<TaskPage['procedure']>;
  open: boolean;
}) {
  return (
    <section className="grid gap-2" aria-labelledby="procedure">
      <h2 id="procedure" className="text-2xl">
        {open ? 'The work' : 'The work as it was done'}
      </h2>
      <p className="text-ink-soft">
        <Link href={`/procedures/${procedure.id}`} className="link inline-flex min-h-target items-center">
          {procedure.name}
        </Link>
        , version {procedure.version}, as it stood when this task was opened. The engine maker’s manual comes
        first.
      </p>
      <Bench />
    </section>
  );
}

/** On which day the work is planned; a task that no rule asks for can be withdrawn. */
export function PlanSection({ task }: { task: TaskPage }) {
  return (
    <section className="grid gap-4" aria-labelledby="plan">
      <h2 id="plan" className="text-2xl">
        Plan
      </h2>
      <PlanForm key={task.plannedOn} task={task} />
      {task.origin === 'rule' ? null : (
        <div>
          <ReasonDialog
            path={`/api/v1/tasks/${task.id}/withdrawal`}
            button="Withdraw this task"
            title="Withdraw this task?"
          >
            <p>It will not be done. {task.defectId ? 'Its defect is cleared with the same reason.' : null}</p>
          </ReasonDialog>
        </div>
      )}
    </section>
  );
}

/** What people wrote on the task. */
export function NotesSection({ task, now, mayWrite }: { task: TaskPage; now: string; mayWrite: boolean }) {
  return (
    <section className="grid gap-4" aria-labelledby="notes">
      <h2 id="notes" className="text-2xl">
        Notes
      </h2>
      <TaskNotes notes={task.notes} timeZone={task.timeZone} now={now} />
      {mayWrite ? <NoteForm taskId={task.id} /> : null}
    </section>
  );
}

/** How the task was closed, and when its rule was last done on the unit. */
export function ClosuresSection({
  task,
  now,
  mayReverse,
}: {
  task: TaskPage;
  now: string;
  mayReverse: boolean;
}) {
  if (task.closures.length === 0) return null;
  return (
    <section className="grid gap-4" aria-labelledby="closures">
      <h2 id="closures" className="text-2xl">
        {task.ruleId ? 'Done before on this unit' : 'Closings'}
      </h2>
      <ClosureList closures={task.closures} timeZone={task.timeZone} now={now} mayReverse={mayReverse} />
    </section>
  );
}
