import type { Metadata } from 'next';
import { ProcedureForm } from '@/components/procedures/ProcedureForm';
import { PageHeader } from '@/components/ui/PageHeader';
import { openProcedureForm } from '@/lib/actions/open-procedure-form';
import { pageContext } from '@/lib/auth/page';
import { orNotFound } from '@/lib/auth/page-row';

export const metadata: Metadata = { title: 'New procedure' };

export default async function NewProcedurePage() {
  const data = await orNotFound(openProcedureForm(await pageContext(), null));
  return (
    <>
      <PageHeader kicker="Procedures" title="New procedure" />
      <ProcedureForm {...data} />
    </>
  );
}
