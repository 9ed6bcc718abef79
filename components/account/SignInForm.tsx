'use client';

import Link from 'next/link';
import { TextInput } from '@/components/ui/TextInput';
import { fieldError } from '@/lib/client/api';
import { goTo } from '@/lib/client/go-to';
import { signIn } from '@/lib/client/sign-in';
import { useSend } from '@/lib/client/use-send';
import { AccountForm } from './AccountForm';

/** E-mail address and password; goes on to `next`, a path of ours. */
export function SignInForm({ next }: { next: string }) {
  const sending = useSend();
  const { failure, run } = sending;
  async function submit(form: HTMLFormElement) {
    const given = new FormData(form);
    const [email, password] = [String(given.get('email')), String(given.get('password'))];
    if (await run(() => signIn(email, password))) goTo(next);
  }
  return (
    <AccountForm
      fields={['email', 'password']}
      button="Sign in"
      sending={sending}
      onSubmit={submit}
      door
      below={
        <p>
          <Link href="/forgot" className="link inline-flex min-h-target items-center">
            Forgot your password?
          </Link>
        </p>
      }
    >
      <TextInput
        name="email"
        type="email"
        label="E-mail address"
        autoComplete="username"
        error={fieldError(failure, 'email')}
        large
      />
      <TextInput
        name="password"
        type="password"
        label="Password"
        autoComplete="current-password"
        error={fieldError(failure, 'password')}
        large
      />
    </AccountForm>
  );
}
