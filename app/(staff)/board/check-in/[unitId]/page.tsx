import type { Metadata } from 'next';
import { cache } from 'react';
import { notFound } from 'next/navigation';
import { CheckIn } from '@/components/check-in/CheckIn';
import { PageHeader } from '@/components/ui/PageHeader';
import { getUnitReadiness } from '@/lib/actions/get-unit-readiness';
import { orNotFound } from '@/lib/auth/page-row';
import { pageContext } from '@/lib/auth/page';
import { id } from '@/lib/schemas/common';

type Props = { params: Promise<{ unitId: string }> };

const load = cache(async (unitId: string) => {
  const parsed = id.safeParse(unitId);
  return parsed.success ? orNotFound(getUnitReadiness(await pageContext(), parsed.data)) : notFound();
});

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const unit = await load((await params).unitId);
  return { title: `Check in ${unit.fleetNumber}` };
}

export default async function CheckInPage({ params }: Props) {
  const ctx = await pageContext();
  const unit = await load((await params).unitId);
  return (
    <>
      <PageHeader title={`Check in ${unit.fleetNumber}`} kicker={`${unit.modelName} · ${unit.dockName}`} />
      <CheckIn unit={unit} now={ctx.now.toISOString()} />
    </>
  );
}
