import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { SignInForm } from '@/components/account/SignInForm';
import { Notice } from '@/components/ui/Notice';
import { getOperator } from '@/lib/actions/get-operator';
import { safeNext } from '@/lib/auth/next-path';
import { isSignedIn, publicContext } from '@/lib/auth/page';

export const metadata: Metadata = { title: 'Sign in' };

type Query = { next?: string | string[]; after?: string | string[] };

const AFTER: Record<string, string> = {
  reset: 'Your password is changed. Sign in with the new one.',
  'sign-out': 'You are signed out everywhere.',
};

export default async function SignInPage({ searchParams }: { searchParams: Promise<Query> }) {
  const query = await searchParams;
  const next = safeNext(typeof query.next === 'string' ? query.next : null);
  if (await isSignedIn()) redirect(next);
  const operator = await getOperator(publicContext());
  if (!operator) redirect('/setup');
  const after = typeof query.after === 'string' ? AFTER[query.after] : undefined;
  return (
    <>
      <h1 className="text-3xl">Sign in to {operator.name}</h1>
      {after ? <Notice tone="ok">{after}</Notice> : null}
      <SignInForm next={next} />
    </>
  );
}
