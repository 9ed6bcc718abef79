import type { Metadata } from 'next';
import { DigestControls } from '@/components/digest/DigestControls';
import { DigestLetter } from '@/components/digest/DigestLetter';
import { PageHeader } from '@/components/ui/PageHeader';
import { previewDigest } from '@/lib/actions/preview-digest';
import { orNotFound } from '@/lib/auth/page-row';
import { pageContext } from '@/lib/auth/page';

export const metadata: Metadata = { title: 'Digest' };

export default async function DigestPage() {
  const ctx = await pageContext();
  const { subject, html, wanted } = await orNotFound(previewDigest(ctx, {}));
  return (
    <>
      <PageHeader
        title="Digest"
        lead="What is overdue, what that cost in days of hire, what is due this week, and what was closed last week."
      >
        <DigestControls wanted={wanted} email={ctx.actor.email} />
      </PageHeader>
      <DigestLetter html={html} subject={subject} />
    </>
  );
}
