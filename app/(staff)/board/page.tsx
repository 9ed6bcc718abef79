import type { Metadata } from 'next';
import { Board } from '@/components/board/Board';
import { EmptyState } from '@/components/ui/EmptyState';
import { PageHeader } from '@/components/ui/PageHeader';
import { SectionNav } from '@/components/ui/SectionNav';
import { getAvailability } from '@/lib/actions/get-availability';
import { listDocks } from '@/lib/actions/list-docks';
import { may } from '@/lib/auth/may';
import { orNotFound } from '@/lib/auth/page-row';
import { pageContext } from '@/lib/auth/page';
import { QueryFrame } from '@/lib/client/QueryFrame';

export const metadata: Metadata = { title: 'Board' };

export default async function BoardPage({ searchParams }: { searchParams: Promise<{ dockId?: string }> }) {
  const ctx = await pageContext();
  const docks = await listDocks(ctx);
  const { dockId } = await searchParams;
  const dock = docks.find(({ id }) => id === dockId) ?? docks[0];
  if (!dock)
    return (
      <>
        <PageHeader title="Board" />
        <EmptyState title="No dock yet">A manager adds docks under Docks.</EmptyState>
      </>
    );
  const first = await orNotFound(getAvailability(ctx, { dockId: dock.id }));
  return (
    <>
      <PageHeader title={dock.name} kicker="Board" />
      {docks.length > 1 ? (
        <div className="mb-4">
          <SectionNav
            label="Docks"
            sections={docks.map(({ id, name }) => ({
              href: `/board?dockId=${id}`,
              label: name,
              current: id === dock.id,
            }))}
          />
        </div>
      ) : null}
      <QueryFrame key={dock.id}>
        <Board dock={dock} first={first} mayAdd={may(ctx, 'unit.write', dock.id)} />
      </QueryFrame>
    </>
  );
}
