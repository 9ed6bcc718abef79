import type { Metadata } from 'next';
import { ProductMark } from '@/components/shell/ProductMark';
import { LinkButton } from '@/components/ui/LinkButton';
import { PageHeader } from '@/components/ui/PageHeader';

export const metadata: Metadata = { title: 'Not found' };

/** For an address that leads nowhere, or to something this person may not see. */
export default function NotFound() {
  return (
    <main className="mx-auto grid max-w-prose gap-8 px-gutter py-8">
      <ProductMark />
      <div>
        <PageHeader title="Nothing is moored here" kicker="Page not found" />
        <p className="mb-6 text-lg">
          The address may be mistyped, or what it led to has been removed or belongs to a dock you do not work
          at.
        </p>
        <LinkButton href="/" kind="primary">
          Go to the start
        </LinkButton>
      </div>
    </main>
  );
}
