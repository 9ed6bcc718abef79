import type { Metadata } from 'next';
import { ModelForm } from '@/components/models/ModelForm';
import { LinkButton } from '@/components/ui/LinkButton';
import { PageHeader } from '@/components/ui/PageHeader';
import { openModelForm } from '@/lib/actions/open-model-form';
import { pageContext } from '@/lib/auth/page';
import { orNotFound, pageId } from '@/lib/auth/page-row';

export const metadata: Metadata = { title: 'Model' };

export default async function ModelPage({ params }: { params: Promise<{ id: string }> }) {
  const data = await orNotFound(openModelForm(await pageContext(), await pageId(params)));
  if (!data.model) return null;
  return (
    <>
      <PageHeader
        kicker="Models"
        title={data.model.name}
        actions={<LinkButton href={`/units?model=${data.model.id}`}>Its units</LinkButton>}
      />
      <ModelForm key={data.model.id} {...data} />
    </>
  );
}
