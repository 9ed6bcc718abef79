import type { Metadata } from 'next';
import { cache } from 'react';
import { DockForm } from '@/components/docks/DockForm';
import { LinkButton } from '@/components/ui/LinkButton';
import { PageHeader } from '@/components/ui/PageHeader';
import { openDockForm } from '@/lib/actions/open-dock-form';
import { pageContext } from '@/lib/auth/page';
import { orNotFound, pageId } from '@/lib/auth/page-row';

type Props = { params: Promise<{ id: string }> };

const load = cache(async (id: string) => orNotFound(openDockForm(await pageContext(), id)));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { dock } = await load(await pageId(params));
  return { title: dock?.name ?? 'Dock' };
}

export default async function DockPage({ params }: Props) {
  const data = await load(await pageId(params));
  if (!data.dock) return null;
  return (
    <>
      <PageHeader
        kicker="Docks"
        title={data.dock.name}
        actions={<LinkButton href={`/units?dock=${data.dock.id}`}>Its units</LinkButton>}
      />
      <DockForm key={data.dock.id} {...data} timeZones={Intl.supportedValuesOf('timeZone')} />
    </>
  );
}
