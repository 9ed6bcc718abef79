import type { Metadata } from 'next';
import { NewTaskForm } from '@/components/task/NewTaskForm';
import { EmptyState } from '@/components/ui/EmptyState';
import { LinkButton } from '@/components/ui/LinkButton';
import { Notice } from '@/components/ui/Notice';
import { PageHeader } from '@/components/ui/PageHeader';
import { listProcedures } from '@/lib/actions/list-procedures';
import { listUnits } from '@/lib/actions/list-units';
import { may } from '@/lib/auth/may';
import { pageContext } from '@/lib/auth/page';

export const metadata: Metadata = { title: 'New task' };

type Query = { unit?: string | string[] };

export default async function NewTaskPage({ searchParams }: { searchParams: Promise<Query> }) {
  const ctx = await pageContext();
  const { unit } = await searchParams;
  const [{ items }, procedures] = await Promise.all([listUnits(ctx, {}), listProcedures(ctx)]);
  const units = items.map(({ id, fleetNumber, modelName, dockName }) => ({
    value: id,
    label: `${fleetNumber}, ${modelName}, ${dockName}`,
  }));
  return (
    <>
      <PageHeader
        title="New task"
        lead="A repair, an inspection or a service that no rule asks for."
        actions={<LinkButton href="/tasks">All tasks</LinkButton>}
      />
      {!may(ctx, 'task.write') ? (
        <Notice tone="info" title="Mechanics and managers open tasks" still>
          Report a defect with the check-in instead: its task opens by itself.
        </Notice>
      ) : units.length === 0 ? (
        <EmptyState
          title="No unit yet"
          action={
            may(ctx, 'unit.write') ? (
              <LinkButton kind="primary" href="/units/new">
                Add a unit
              </LinkButton>
            ) : null
          }
        >
          A task belongs to a unit. A manager adds the first one.
        </EmptyState>
      ) : (
        <NewTaskForm
          units={units}
          unitId={typeof unit === 'string' ? unit : ''}
          procedures={procedures.map(({ id, name }) => ({ value: id, label: name }))}
        />
      )}
    </>
  );
}
