import type { Metadata } from 'next';
import { cache } from 'react';
import { RetireUnit } from '@/components/units/RetireUnit';
import { UnitForm } from '@/components/units/UnitForm';
import { LinkButton } from '@/components/ui/LinkButton';
import { Notice } from '@/components/ui/Notice';
import { PageHeader } from '@/components/ui/PageHeader';
import { openUnitForm } from '@/lib/actions/open-unit-form';
import { pageContext } from '@/lib/auth/page';
import { orNotFound, pageId } from '@/lib/auth/page-row';

type Props = { params: Promise<{ id: string }> };

const load = cache(async (id: string) => orNotFound(openUnitForm(await pageContext(), id)));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { unit } = await load(await pageId(params));
  return { title: `Change ${unit?.fleetNumber ?? 'a unit'}` };
}

export default async function EditUnitPage({ params }: Props) {
  const data = await load(await pageId(params));
  const { unit } = data;
  if (!unit) return null;
  return (
    <>
      <PageHeader
        kicker="Change"
        title={<span className="numerals">{unit.fleetNumber}</span>}
        actions={<LinkButton href={`/units/${unit.id}`}>Back to the unit</LinkButton>}
      />
      {unit.retiredAt ? (
        <Notice still title="Retired">
          A retired unit is not changed any more.
        </Notice>
      ) : (
        <div className="grid gap-12">
          <UnitForm key={unit.id} data={data} />
          <section className="grid max-w-3xl justify-items-start gap-3 border-t-2 border-line pt-4">
            <h2 className="text-xl">Retire</h2>
            <p className="max-w-prose">
              For a craft that is sold, lost or broken up. To take it out for a while, lay it up instead.
            </p>
            <RetireUnit unit={{ id: unit.id, fleetNumber: unit.fleetNumber }} />
          </section>
        </div>
      )}
    </>
  );
}
