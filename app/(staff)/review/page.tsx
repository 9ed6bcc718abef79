import type { Metadata } from 'next';
import { ReviewItem } from '@/components/review/ReviewItem';
import { EmptyState } from '@/components/ui/EmptyState';
import { LinkButton } from '@/components/ui/LinkButton';
import { PageHeader } from '@/components/ui/PageHeader';
import { listReadings } from '@/lib/actions/list-readings';
import { orNotFound } from '@/lib/auth/page-row';
import { pageContext } from '@/lib/auth/page';

export const metadata: Metadata = { title: 'Review' };

export default async function ReviewPage({ searchParams }: { searchParams: Promise<{ cursor?: string }> }) {
  const ctx = await pageContext();
  const { cursor } = await searchParams;
  const page = await orNotFound(listReadings(ctx, { review: 'open', limit: 25, cursor }));
  return (
    <>
      <PageHeader
        title="Review"
        lead="Readings that were kept though they are unusual: accept each, or void it with what the meter showed."
      />
      {page.items.length === 0 ? (
        <EmptyState title="No reading waits for you">
          An unusual jump of a meter, or an entry that arrived late, is listed here.
        </EmptyState>
      ) : (
        <ul className="grid gap-8">
          {page.items.map((reading) => (
            <li key={reading.id}>
              <ReviewItem reading={reading} />
            </li>
          ))}
        </ul>
      )}
      {page.nextCursor ? (
        <p className="mt-6">
          <LinkButton href={`/review?cursor=${encodeURIComponent(page.nextCursor)}`}>
            Further readings
          </LinkButton>
        </p>
      ) : null}
    </>
  );
}
