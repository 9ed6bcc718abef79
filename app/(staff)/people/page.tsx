import type { Metadata } from 'next';
import { InvitationsTable } from '@/components/people/InvitationsTable';
import { InviteButton } from '@/components/people/InviteForm';
import { PeopleTable } from '@/components/people/PeopleTable';
import { PageHeader } from '@/components/ui/PageHeader';
import { listDocks } from '@/lib/actions/list-docks';
import { listInvitations } from '@/lib/actions/list-invitations';
import { listPeople } from '@/lib/actions/list-people';
import { pageContext } from '@/lib/auth/page';
import { orNotFound } from '@/lib/auth/page-row';

export const metadata: Metadata = { title: 'People' };

export default async function PeoplePage() {
  const ctx = await pageContext();
  const people = await orNotFound(listPeople(ctx));
  const [invitations, docks] = [await listInvitations(ctx), await listDocks(ctx)];
  return (
    <>
      <PageHeader
        title="People"
        lead="Who may sign in, as what, and at which docks."
        actions={<InviteButton docks={docks} />}
      />
      <PeopleTable people={people} docks={docks} />
      <section className="mt-10">
        <h2 className="mb-2 text-2xl">Open invitations</h2>
        <InvitationsTable invitations={invitations} docks={docks} now={ctx.now} />
      </section>
    </>
  );
}
