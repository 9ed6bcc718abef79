import type { Metadata } from 'next';
import { UnitForm } from '@/components/units/UnitForm';
import { EmptyState } from '@/components/ui/EmptyState';
import { LinkButton } from '@/components/ui/LinkButton';
import { PageHeader } from '@/components/ui/PageHeader';
import { openUnitForm } from '@/lib/actions/open-unit-form';
import { pageContext } from '@/lib/auth/page';
import { orNotFound } from '@/lib/auth/page-row';

export const metadata: Metadata = { title: 'New unit' };

export default async function NewUnitPage() {
  const data = await orNotFound(openUnitForm(await pageContext(), null));
  const missing = data.docks.length === 0 ? 'dock' : data.models.length === 0 ? 'model' : null;
  return (
    <>
      <PageHeader kicker="Units" title="New unit" />
      {missing ? (
        <EmptyState
          title={`No ${missing} yet`}
          action={
            <LinkButton kind="primary" href={`/${missing}s/new`}>
              Add a {missing}
            </LinkButton>
          }
        >
          A unit is of a model and at a dock, so those come first.
        </EmptyState>
      ) : (
        <UnitForm data={data} />
      )}
    </>
  );
}
