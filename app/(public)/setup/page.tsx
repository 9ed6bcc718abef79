import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { SetupForm } from '@/components/setup/SetupForm';
import { getOperator } from '@/lib/actions/get-operator';
import { publicContext } from '@/lib/auth/page';

export const metadata: Metadata = { title: 'Set up' };

export default async function SetupPage() {
  if (await getOperator(publicContext())) redirect('/sign-in');
  return (
    <>
      <div className="grid gap-2">
        <h1 className="text-3xl">Set up Wakewright</h1>
        <p>
          Name the operator, its first dock and its first manager. This is done once; the rest is added later
          from inside.
        </p>
      </div>
      <SetupForm timeZones={Intl.supportedValuesOf('timeZone')} />
    </>
  );
}
