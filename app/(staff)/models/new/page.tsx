import type { Metadata } from 'next';
import { ModelForm } from '@/components/models/ModelForm';
import { PageHeader } from '@/components/ui/PageHeader';
import { openModelForm } from '@/lib/actions/open-model-form';
import { pageContext } from '@/lib/auth/page';
import { orNotFound } from '@/lib/auth/page-row';

export const metadata: Metadata = { title: 'New model' };

export default async function NewModelPage() {
  const data = await orNotFound(openModelForm(await pageContext(), null));
  return (
    <>
      <PageHeader kicker="Models" title="New model" />
      <ModelForm {...data} />
    </>
  );
}
