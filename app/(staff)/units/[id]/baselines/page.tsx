import type { Metadata } from 'next';
import { cache } from 'react';
import { BaselineForm } from '@/components/rules/BaselineForm';
import { BaselineHistory } from '@/components/rules/BaselineHistory';
import { EmptyState } from '@/components/ui/EmptyState';
import { LinkButton } from '@/components/ui/LinkButton';
import { Notice } from '@/components/ui/Notice';
import { PageHeader } from '@/components/ui/PageHeader';
import { openBaselines } from '@/lib/actions/open-baselines';
import { pageContext } from '@/lib/auth/page';
import { orNotFound, pageId } from '@/lib/auth/page-row';

type Props = { params: Promise<{ id: string }> };

const load = cache(async (id: string) => orNotFound(openBaselines(await pageContext(), id)));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { unit } = await load(await pageId(params));
  return { title: `Last done before ${unit.fleetNumber} came` };
}

export default async function BaselinesPage({ params }: Props) {
  const data = await load(await pageId(params));
  const { unit, standing, baselines, mayRecord, mayWithdraw } = data;
  return (
    <>
      <PageHeader
        kicker={`${unit.fleetNumber} · ${unit.dockName}`}
        title="Last done before it came"
        lead={`The unit stands at ${standing.engineHours.toFixed(1)} h and ${standing.outings} outings. Work without a record counts as not done.`}
        actions={<LinkButton href={`/units/${unit.id}`}>Back to the unit</LinkButton>}
      />
      {standing.assessed ? null : (
        <div className="mb-6">
          <Notice still title="Not yet assessed">
            Its due points are being worked out; until then the unit is held.
          </Notice>
        </div>
      )}
      {standing.items.length === 0 ? (
        <EmptyState
          title="No rule is for this unit"
          action={<LinkButton href="/rules">See the rules</LinkButton>}
        >
          Once one is, this is where to say when its work was last done.
        </EmptyState>
      ) : mayRecord ? (
        <BaselineForm data={data} />
      ) : null}
      <section className="mt-10 grid gap-3">
        <h2 className="text-2xl">Recorded</h2>
        <BaselineHistory baselines={baselines} mayWithdraw={mayWithdraw} />
      </section>
    </>
  );
}
