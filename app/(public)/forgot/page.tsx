import type { Metadata } from 'next';
import Link from 'next/link';
import { ForgotForm } from '@/components/account/ForgotForm';

export const metadata: Metadata = { title: 'Forgot your password?' };

export default function ForgotPage() {
  return (
    <>
      <div className="grid gap-2">
        <h1 className="text-3xl">Forgot your password?</h1>
        <p>Give the e-mail address you sign in with. We send you a link for choosing a new password.</p>
      </div>
      <ForgotForm />
      <p>
        <Link href="/sign-in" className="link inline-flex min-h-target items-center">
          Back to sign in
        </Link>
      </p>
    </>
  );
}
