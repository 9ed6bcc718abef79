import type { Metadata } from 'next';
import { cache } from 'react';
import { ProcedureForm } from '@/components/procedures/ProcedureForm';
import { LinkButton } from '@/components/ui/LinkButton';
import { PageHeader } from '@/components/ui/PageHeader';
import { openProcedureForm } from '@/lib/actions/open-procedure-form';
import { pageContext } from '@/lib/auth/page';
import { orNotFound, pageId } from '@/lib/auth/page-row';

type Props = { params: Promise<{ id: string }> };

const load = cache(async (id: string) => orNotFound(openProcedureForm(await pageContext(), id)));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { procedure } = await load(await pageId(params));
  return { title: `Change ${procedure?.name ?? ''}` };
}

export default async function ChangeProcedurePage({ params }: Props) {
  const id = await pageId(params);
  const data = await load(id);
  return (
    <>
      <PageHeader
        kicker="Change"
        title={data.procedure?.name}
        actions={<LinkButton href={`/procedures/${id}`}>Back to the procedure</LinkButton>}
      />
      <ProcedureForm {...data} />
    </>
  );
}
