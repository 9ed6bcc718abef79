'use client';

import type { FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { TextInput } from '@/components/ui/TextInput';
import { fieldError, formError, send } from '@/lib/client/api';
import { rawOf, textOf } from '@/lib/client/form-values';
import { goTo } from '@/lib/client/go-to';
import { signIn } from '@/lib/client/sign-in';
import { useSend } from '@/lib/client/use-send';
import { NewPasswordInput } from './NewPasswordInput';

/** Accepts an invitation: one's name as one writes it, and a password. Signs in right away. */
export function AcceptForm({ token, name, email }: { token: string; name: string; email: string }) {
  const { busy, failure, run } = useSend();
  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    const password = rawOf(form, 'password');
    const body = { token, name: textOf(form, 'name'), password };
    const accepted = await run(() => send('POST', '/api/v1/invitations/acceptance', body));
    if (!accepted) return;
    goTo((await run(() => signIn(email, password))) ? '/' : '/sign-in');
  }
  const error = formError(failure, ['name', 'password']);
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-5">
      {error ? <Notice tone="danger">{error}</Notice> : null}
      <TextInput
        name="email"
        type="email"
        label="E-mail address"
        hint="You sign in with it."
        autoComplete="username"
        value={email}
        readOnly
      />
      <TextInput
        name="name"
        label="Your name"
        autoComplete="name"
        defaultValue={name}
        error={fieldError(failure, 'name')}
        large
      />
      <NewPasswordInput error={fieldError(failure, 'password')} />
      <Button type="submit" kind="primary" size="large" wide busy={busy}>
        Accept and sign in
      </Button>
    </form>
  );
}
