import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { CheckOut } from '@/components/check-out/CheckOut';
import { PageHeader } from '@/components/ui/PageHeader';
import { getUnitReadiness } from '@/lib/actions/get-unit-readiness';
import { orNotFound } from '@/lib/auth/page-row';
import { pageContext } from '@/lib/auth/page';
import { id } from '@/lib/schemas/common';

export const metadata: Metadata = { title: 'Check out' };

export default async function CheckOutPage({ params }: { params: Promise<{ unitId: string }> }) {
  const ctx = await pageContext();
  const unitId = id.safeParse((await params).unitId);
  if (!unitId.success) notFound();
  const unit = await orNotFound(getUnitReadiness(ctx, unitId.data));
  return (
    <>
      <PageHeader title={`Check out ${unit.fleetNumber}`} kicker={`${unit.modelName} · ${unit.dockName}`} />
      <CheckOut unit={unit} now={ctx.now.toISOString()} />
    </>
  );
}
