import type { Metadata } from 'next';
import { PartTable } from '@/components/parts/PartTable';
import { EmptyState } from '@/components/ui/EmptyState';
import { LinkButton } from '@/components/ui/LinkButton';
import { PageHeader } from '@/components/ui/PageHeader';
import { SectionNav } from '@/components/ui/SectionNav';
import { listDocks } from '@/lib/actions/list-docks';
import { listParts } from '@/lib/actions/list-parts';
import { mayFleetWide } from '@/lib/auth/may';
import { pageContext } from '@/lib/auth/page';

export const metadata: Metadata = { title: 'Parts' };

type Props = { searchParams: Promise<{ show?: string; cursor?: string }> };

/** All parts that a fleet is likely to have stand on one page. */
const PAGE = 500;

export default async function PartsPage({ searchParams }: Props) {
  const ctx = await pageContext();
  const { show } = await searchParams;
  const [docks, page] = await Promise.all([listDocks(ctx), listParts(ctx, { limit: PAGE })]);
  const all = page.items;
  const low = all.filter((part) => part.low);
  const kits = all.filter((part) => part.isKit);
  const shown = { low, kits }[show ?? ''] ?? all;
  const add = mayFleetWide(ctx, 'part.write') ? (
    <LinkButton kind="primary" href="/parts/new">
      Add a part
    </LinkButton>
  ) : null;
  return (
    <>
      <PageHeader title="Parts" lead="What lies on the shelves of each dock, low ones first." actions={add} />
      <div className="grid gap-4">
        <SectionNav
          label="Which parts"
          sections={[
            { href: '/parts', label: 'All', current: shown === all, count: all.length },
            { href: '/parts?show=low', label: 'Low', current: shown === low, count: low.length },
            { href: '/parts?show=kits', label: 'Kits', current: shown === kits, count: kits.length },
          ]}
        />
        <PartTable
          key={show ?? ''}
          parts={shown}
          docks={docks}
          empty={
            shown === low ? (
              <EmptyState title="Nothing is low">
                A part is low when as many as its mark or fewer are free. Set marks on the page of each part.
              </EmptyState>
            ) : (
              <EmptyState title="No parts yet" action={add}>
                Add the parts and kits that work takes, receive what is there, and name them in the rules.
              </EmptyState>
            )
          }
        />
        {page.nextCursor ? <p className="text-ink-soft">The first {PAGE} parts are shown.</p> : null}
      </div>
    </>
  );
}
