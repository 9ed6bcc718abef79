import type { Metadata } from 'next';
import { AcceptForm } from '@/components/account/AcceptForm';
import { LinkButton } from '@/components/ui/LinkButton';
import { Notice } from '@/components/ui/Notice';
import { findInvitation } from '@/lib/actions/find-invitation';
import { publicContext } from '@/lib/auth/page';

export const metadata: Metadata = { title: 'Accept the invitation' };

export default async function InvitationPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  const invited = await findInvitation(publicContext(), { token });
  if (!invited) {
    return (
      <>
        <h1 className="text-3xl">Invitation</h1>
        <Notice
          tone="warn"
          title="This invitation works no more"
          action={<LinkButton href="/sign-in">Go to sign in</LinkButton>}
        >
          It was accepted, withdrawn or sent again, or seven days are over. If you have no password yet, ask a
          manager to send it again.
        </Notice>
      </>
    );
  }
  return (
    <>
      <div className="grid gap-2">
        <h1 className="text-3xl">Welcome to {invited.operatorName}</h1>
        <p>Choose a password and you are in.</p>
      </div>
      <AcceptForm token={token} name={invited.name} email={invited.email} />
    </>
  );
}
