import type { Metadata } from 'next';
import { CheckOut } from '@/components/check-out/CheckOut';
import { PageHeader } from '@/components/ui/PageHeader';
import { pageContext } from '@/lib/auth/page';
import { loadUnit } from '../../load-unit';

type Props = { params: Promise<{ unitId: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const unit = await loadUnit((await params).unitId);
  return { title: `Check out ${unit.fleetNumber}` };
}

export default async function CheckOutPage({ params }: Props) {
  const ctx = await pageContext();
  const unit = await loadUnit((await params).unitId);
  return (
    <>
      <PageHeader title={`Check out ${unit.fleetNumber}`} kicker={`${unit.modelName} · ${unit.dockName}`} />
      <CheckOut unit={unit} now={ctx.now.toISOString()} />
    </>
  );
}
