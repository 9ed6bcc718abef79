import type { Metadata } from 'next';
import { AvailabilityScreen } from '@/components/availability/AvailabilityScreen';
import { PageHeader } from '@/components/ui/PageHeader';
import { getAvailability } from '@/lib/actions/get-availability';
import { listDocks } from '@/lib/actions/list-docks';
import { may } from '@/lib/auth/may';
import { pageContext } from '@/lib/auth/page';
import { QueryFrame } from '@/lib/client/QueryFrame';

export const metadata: Metadata = { title: 'Availability' };

export default async function AvailabilityPage() {
  const ctx = await pageContext();
  const [docks, first] = [await listDocks(ctx), await getAvailability(ctx, {})];
  return (
    <>
      <PageHeader
        title="Availability"
        lead="What may be hired out, what is out, and what is held: why, and what lifts it."
      />
      <QueryFrame>
        <AvailabilityScreen docks={docks} first={first} mayAdd={may(ctx, 'unit.write')} />
      </QueryFrame>
    </>
  );
}
