import type { Metadata } from 'next';
import { ResetForm } from '@/components/account/ResetForm';
import { LinkButton } from '@/components/ui/LinkButton';
import { Notice } from '@/components/ui/Notice';
import { findPasswordReset } from '@/lib/actions/find-password-reset';
import { publicContext } from '@/lib/auth/page';

export const metadata: Metadata = { title: 'Choose a new password' };

export default async function ResetPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  const reset = await findPasswordReset(publicContext(), { token });
  return (
    <>
      <h1 className="text-3xl">Choose a new password</h1>
      {reset ? (
        <>
          <p>
            For {reset.email}. Everybody who is signed in with the old password, on any device, is signed out.
          </p>
          <ResetForm token={token} email={reset.email} />
        </>
      ) : (
        <Notice
          tone="warn"
          title="This link works no more"
          action={<LinkButton href="/forgot">Send me a new link</LinkButton>}
        >
          A link works once and for one hour.
        </Notice>
      )}
    </>
  );
}
