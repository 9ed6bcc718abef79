import type { Metadata } from 'next';
import { ProcedureTable } from '@/components/procedures/ProcedureTable';
import { EmptyState } from '@/components/ui/EmptyState';
import { PageHeader } from '@/components/ui/PageHeader';
import { listProcedures } from '@/lib/actions/list-procedures';
import { pageContext } from '@/lib/auth/page';

export const metadata: Metadata = { title: 'Procedures' };

export default async function ProceduresPage() {
  const procedures = await listProcedures(await pageContext());
  return (
    <>
      <PageHeader
        title="Procedures"
        lead="How work is done, step by step. A task keeps the version that stood when it was opened."
      />
      {procedures.length === 0 ? (
        <EmptyState title="No procedure in use">
          A rule whose work has no procedure is closed with a note.
        </EmptyState>
      ) : (
        <ProcedureTable procedures={procedures} />
      )}
    </>
  );
}
