import type { Metadata } from 'next';
import { ProcedureTable } from '@/components/procedures/ProcedureTable';
import { EmptyState } from '@/components/ui/EmptyState';
import { LinkButton } from '@/components/ui/LinkButton';
import { PageHeader } from '@/components/ui/PageHeader';
import { listProcedures } from '@/lib/actions/list-procedures';
import { mayFleetWide } from '@/lib/auth/may';
import { pageContext } from '@/lib/auth/page';

export const metadata: Metadata = { title: 'Procedures' };

export default async function ProceduresPage() {
  const ctx = await pageContext();
  const procedures = await listProcedures(ctx);
  const add = mayFleetWide(ctx, 'procedure.write') ? (
    <LinkButton kind="primary" href="/procedures/new">
      Write a procedure
    </LinkButton>
  ) : null;
  return (
    <>
      <PageHeader
        title="Procedures"
        lead="How work is done, step by step. A task keeps the version that stood when it was opened."
        actions={add}
      />
      {procedures.length === 0 ? (
        <EmptyState title="No procedure in use" action={add}>
          A rule whose work has no procedure is closed with a note.
        </EmptyState>
      ) : (
        <ProcedureTable procedures={procedures} />
      )}
    </>
  );
}
