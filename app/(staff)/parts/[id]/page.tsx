import type { Metadata } from 'next';
import { cache } from 'react';
import { Ledger } from '@/components/parts/Ledger';
import { LevelTable } from '@/components/parts/LevelTable';
import { PartUses } from '@/components/parts/PartUses';
import { StockForm } from '@/components/parts/StockForm';
import { LinkButton } from '@/components/ui/LinkButton';
import { Notice } from '@/components/ui/Notice';
import { PageHeader } from '@/components/ui/PageHeader';
import { getPart } from '@/lib/actions/get-part';
import { listDocks } from '@/lib/actions/list-docks';
import { listStockMoves } from '@/lib/actions/list-stock-moves';
import { may, mayFleetWide } from '@/lib/auth/may';
import { pageContext } from '@/lib/auth/page';
import { orNotFound, pageId } from '@/lib/auth/page-row';

type Props = { params: Promise<{ id: string }>; searchParams: Promise<{ cursor?: string }> };

const load = cache(async (id: string) => orNotFound(getPart(await pageContext(), id)));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: (await load(await pageId(params))).name };
}

export default async function PartPage({ params, searchParams }: Props) {
  const ctx = await pageContext();
  const part = await load(await pageId(params));
  const { cursor } = await searchParams;
  const [docks, ledger] = await Promise.all([
    listDocks(ctx),
    orNotFound(listStockMoves(ctx, { partId: part.id, limit: 50, ...(cursor && { cursor }) })),
  ]);
  const own = docks.filter(({ id }) => may(ctx, 'stock.write', id)).map(({ id, name }) => ({ id, name }));
  const mayChange = mayFleetWide(ctx, 'part.write') && !part.retiredAt;
  return (
    <>
      <PageHeader
        kicker={[part.isKit ? 'Kit' : 'Part', part.number, part.supplier].filter(Boolean).join(' · ')}
        title={part.name}
        actions={
          <>
            {mayChange ? <LinkButton href={`/parts/${part.id}/edit`}>Change</LinkButton> : null}
            <LinkButton href="/parts">All parts</LinkButton>
          </>
        }
      />
      <div className="grid gap-x-12 gap-y-8 lg:grid-cols-[3fr_2fr]">
        <div className="grid min-w-0 content-start gap-8">
          {part.retiredAt ? (
            <Notice still>This part is retired: it is offered nowhere any more.</Notice>
          ) : null}
          <section className="grid gap-2" aria-labelledby="shelves">
            <h2 id="shelves" className="text-2xl">
              On the shelves
            </h2>
            <LevelTable levels={part.levels} />
          </section>
          <PartUses part={part} />
        </div>
        {own.length > 0 && !part.retiredAt ? (
          <section
            className="no-print grid gap-4 self-start border-t-4 border-line bg-raised p-5"
            aria-labelledby="stock"
          >
            <h2 id="stock" className="text-2xl">
              Stock
            </h2>
            <StockForm part={part} docks={own} />
          </section>
        ) : null}
      </div>
      <section className="mt-10 grid gap-2" aria-labelledby="ledger">
        <h2 id="ledger" className="text-2xl">
          Ledger
        </h2>
        <Ledger moves={ledger.items} now={ctx.now.toISOString()} />
        <div className="no-print flex flex-wrap gap-3">
          {cursor ? <LinkButton href={`/parts/${part.id}`}>Latest moves</LinkButton> : null}
          {ledger.nextCursor ? (
            <LinkButton href={`/parts/${part.id}?cursor=${ledger.nextCursor}`}>Earlier moves</LinkButton>
          ) : null}
        </div>
      </section>
    </>
  );
}
