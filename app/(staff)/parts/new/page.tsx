import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { PartForm } from '@/components/parts/PartForm';
import { PageHeader } from '@/components/ui/PageHeader';
import { listParts } from '@/lib/actions/list-parts';
import { mayFleetWide } from '@/lib/auth/may';
import { pageContext } from '@/lib/auth/page';

export const metadata: Metadata = { title: 'Add a part' };

export default async function NewPartPage() {
  const ctx = await pageContext();
  if (!mayFleetWide(ctx, 'part.write')) notFound();
  const { items } = await listParts(ctx, { limit: 500 });
  return (
    <>
      <PageHeader title="Add a part" />
      <PartForm part={null} parts={items} />
    </>
  );
}
