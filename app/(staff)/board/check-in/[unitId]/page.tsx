import type { Metadata } from 'next';
import { CheckIn } from '@/components/check-in/CheckIn';
import { PageHeader } from '@/components/ui/PageHeader';
import { pageContext } from '@/lib/auth/page';
import { loadUnit } from '../../load-unit';

type Props = { params: Promise<{ unitId: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const unit = await loadUnit((await params).unitId);
  return { title: `Check in ${unit.fleetNumber}` };
}

export default async function CheckInPage({ params }: Props) {
  const ctx = await pageContext();
  const unit = await loadUnit((await params).unitId);
  return (
    <>
      <PageHeader title={`Check in ${unit.fleetNumber}`} kicker={`${unit.modelName} · ${unit.dockName}`} />
      <CheckIn unit={unit} now={ctx.now.toISOString()} />
    </>
  );
}
