import type { Metadata } from 'next';
import { DockForm } from '@/components/docks/DockForm';
import { LinkButton } from '@/components/ui/LinkButton';
import { PageHeader } from '@/components/ui/PageHeader';
import { openDockForm } from '@/lib/actions/open-dock-form';
import { pageContext } from '@/lib/auth/page';
import { orNotFound, pageId } from '@/lib/auth/page-row';

export const metadata: Metadata = { title: 'Dock' };

export default async function DockPage({ params }: { params: Promise<{ id: string }> }) {
  const data = await orNotFound(openDockForm(await pageContext(), await pageId(params)));
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
