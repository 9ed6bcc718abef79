import type { Metadata } from 'next';
import { DockTable } from '@/components/docks/DockTable';
import { EmptyState } from '@/components/ui/EmptyState';
import { LinkButton } from '@/components/ui/LinkButton';
import { PageHeader } from '@/components/ui/PageHeader';
import { openDocks } from '@/lib/actions/open-docks';
import { pageContext } from '@/lib/auth/page';

export const metadata: Metadata = { title: 'Docks' };

export default async function DocksPage() {
  const { docks, mayWrite } = await openDocks(await pageContext());
  const add = mayWrite ? (
    <LinkButton kind="primary" href="/docks/new">
      Add a dock
    </LinkButton>
  ) : null;
  return (
    <>
      <PageHeader title="Docks" lead="Where craft are hired out, and when." actions={add} />
      {docks.length === 0 ? (
        <EmptyState title="No dock yet" action={add}>
          A dock has the time zone by which its days begin, a season and its opening weekdays.
        </EmptyState>
      ) : (
        <DockTable docks={docks} />
      )}
    </>
  );
}
