import type { Metadata } from 'next';
import { cache } from 'react';
import { ModelForm } from '@/components/models/ModelForm';
import { LinkButton } from '@/components/ui/LinkButton';
import { PageHeader } from '@/components/ui/PageHeader';
import { openModelForm } from '@/lib/actions/open-model-form';
import { pageContext } from '@/lib/auth/page';
import { orNotFound, pageId } from '@/lib/auth/page-row';

type Props = { params: Promise<{ id: string }> };

const load = cache(async (id: string) => orNotFound(openModelForm(await pageContext(), id)));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { model } = await load(await pageId(params));
  return { title: model?.name ?? 'Model' };
}

export default async function ModelPage({ params }: Props) {
  const data = await load(await pageId(params));
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
