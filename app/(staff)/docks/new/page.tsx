import type { Metadata } from 'next';
import { DockForm } from '@/components/docks/DockForm';
import { PageHeader } from '@/components/ui/PageHeader';
import { openDockForm } from '@/lib/actions/open-dock-form';
import { pageContext } from '@/lib/auth/page';
import { orNotFound } from '@/lib/auth/page-row';

export const metadata: Metadata = { title: 'New dock' };

export default async function NewDockPage() {
  const data = await orNotFound(openDockForm(await pageContext(), null));
  return (
    <>
      <PageHeader kicker="Docks" title="New dock" />
      <DockForm {...data} timeZones={Intl.supportedValuesOf('timeZone')} />
    </>
  );
}
