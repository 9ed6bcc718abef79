import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { PartForm } from '@/components/parts/PartForm';
import { RetirePart } from '@/components/parts/RetirePart';
import { PageHeader } from '@/components/ui/PageHeader';
import { getPart } from '@/lib/actions/get-part';
import { listParts } from '@/lib/actions/list-parts';
import { mayFleetWide } from '@/lib/auth/may';
import { pageContext } from '@/lib/auth/page';
import { orNotFound, pageId } from '@/lib/auth/page-row';

export const metadata: Metadata = { title: 'Change a part' };

export default async function ChangePartPage({ params }: { params: Promise<{ id: string }> }) {
  const ctx = await pageContext();
  if (!mayFleetWide(ctx, 'part.write')) notFound();
  const part = await orNotFound(getPart(ctx, await pageId(params)));
  if (part.retiredAt) notFound();
  const { items } = await listParts(ctx, { limit: 500 });
  return (
    <>
      <PageHeader title={`Change ${part.name}`} kicker={part.isKit ? 'Kit' : 'Part'} />
      <PartForm part={part} parts={items} />
      <RetirePart part={part} />
    </>
  );
}
