'use client';

import Link from 'next/link';
import type { FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { TextInput } from '@/components/ui/TextInput';
import { fieldError, formError } from '@/lib/client/api';
import { goTo } from '@/lib/client/go-to';
import { signIn } from '@/lib/client/sign-in';
import { useSend } from '@/lib/client/use-send';

/** E-mail address and password; goes on to `next`, a path of ours. */
export function SignInForm({ next }: { next: string }) {
  const { busy, failure, run } = useSend();
  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const given = new FormData(event.currentTarget);
    const [email, password] = [String(given.get('email')), String(given.get('password'))];
    if (await run(() => signIn(email, password))) goTo(next);
  }
  const error = formError(failure, ['email', 'password']);
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-5">
      {error ? <Notice tone="danger">{error}</Notice> : null}
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
      <Button type="submit" kind="primary" size="large" wide busy={busy}>
        Sign in
      </Button>
      <p>
        <Link href="/forgot" className="link inline-flex min-h-target items-center">
          Forgot your password?
        </Link>
      </p>
    </form>
  );
}
