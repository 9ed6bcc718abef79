import type { Metadata } from 'next';
import { ModelTable } from '@/components/models/ModelTable';
import { EmptyState } from '@/components/ui/EmptyState';
import { LinkButton } from '@/components/ui/LinkButton';
import { PageHeader } from '@/components/ui/PageHeader';
import { openModels } from '@/lib/actions/open-models';
import { pageContext } from '@/lib/auth/page';

export const metadata: Metadata = { title: 'Models' };

export default async function ModelsPage() {
  const { models, mayWrite } = await openModels(await pageContext());
  const add = mayWrite ? (
    <LinkButton kind="primary" href="/models/new">
      Add a model
    </LinkButton>
  ) : null;
  return (
    <>
      <PageHeader title="Models" lead="What units of one kind share: engine and specs." actions={add} />
      {models.length === 0 ? (
        <EmptyState title="No model yet" action={add}>
          Every unit is of a model. Rules choose units by its engine and carburettors.
        </EmptyState>
      ) : (
        <ModelTable models={models} />
      )}
    </>
  );
}
