import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { CheckIn } from '@/components/check-in/CheckIn';
import { PageHeader } from '@/components/ui/PageHeader';
import { getUnitReadiness } from '@/lib/actions/get-unit-readiness';
import { orNotFound } from '@/lib/auth/page-row';
import { pageContext } from '@/lib/auth/page';
import { id } from '@/lib/schemas/common';

export const metadata: Metadata = { title: 'Check in' };

export default async function CheckInPage({ params }: { params: Promise<{ unitId: string }> }) {
  const ctx = await pageContext();
  const unitId = id.safeParse((await params).unitId);
  if (!unitId.success) notFound();
  const unit = await orNotFound(getUnitReadiness(ctx, unitId.data));
  return (
    <>
      <PageHeader title={`Check in ${unit.fleetNumber}`} kicker={`${unit.modelName} · ${unit.dockName}`} />
      <CheckIn unit={unit} now={ctx.now.toISOString()} />
    </>
  );
}
