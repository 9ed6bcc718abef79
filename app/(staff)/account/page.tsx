import type { Metadata } from 'next';
import { ApiKeys } from '@/components/account/ApiKeys';
import { EverywhereButton } from '@/components/account/EverywhereButton';
import { PasswordForm } from '@/components/account/PasswordForm';
import { ProfileForm } from '@/components/account/ProfileForm';
import { docksInWords, roleWord } from '@/components/people/words';
import { PageHeader } from '@/components/ui/PageHeader';
import { getAccount } from '@/lib/actions/get-account';
import { listApiKeys } from '@/lib/actions/list-api-keys';
import { listDocks } from '@/lib/actions/list-docks';
import { pageContext } from '@/lib/auth/page';

export const metadata: Metadata = { title: 'Account' };

export default async function AccountPage() {
  const ctx = await pageContext();
  const [account, keys, docks] = [await getAccount(ctx), await listApiKeys(ctx), await listDocks(ctx)];
  return (
    <>
      <PageHeader
        title="Account"
        lead={`${account.email} · ${roleWord(account.role)} · ${docksInWords(account.dockIds, docks)}`}
      />
      <div className="grid gap-10">
        <ProfileForm account={account} />
        <section className="grid gap-4">
          <h2 className="text-2xl">Password</h2>
          <PasswordForm email={account.email} />
        </section>
        {account.role === 'manager' || keys.length > 0 ? (
          <section className="grid gap-4">
            <h2 className="text-2xl">API keys</h2>
            <ApiKeys keys={keys} mayCreate={account.role === 'manager'} now={ctx.now.toISOString()} />
          </section>
        ) : null}
        <section className="grid gap-4">
          <h2 className="text-2xl">Sessions</h2>
          <p className="max-w-prose">
            A session ends 14 days after sign-in. If you lost a device, end all of them, this one too.
          </p>
          <EverywhereButton />
        </section>
      </div>
    </>
  );
}
