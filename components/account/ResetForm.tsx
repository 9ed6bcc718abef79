'use client';

import type { FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { fieldError, formError, send } from '@/lib/client/api';
import { rawOf } from '@/lib/client/form-values';
import { goTo } from '@/lib/client/go-to';
import { useSend } from '@/lib/client/use-send';
import { NewPasswordInput } from './NewPasswordInput';

/** Chooses a new password with the token of a link. The e-mail address is there for password managers. */
export function ResetForm({ token, email }: { token: string; email: string }) {
  const { busy, failure, run } = useSend();
  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const password = rawOf(event.currentTarget, 'password');
    const done = await run(() => send('POST', '/api/v1/password-resets/completion', { token, password }));
    if (done) goTo('/sign-in?after=reset');
  }
  const error = formError(failure, ['password']);
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-5">
      {error ? <Notice tone="danger">{error}</Notice> : null}
      <input type="hidden" name="username" autoComplete="username" value={email} />
      <NewPasswordInput label="New password" error={fieldError(failure, 'password')} />
      <Button type="submit" kind="primary" size="large" wide busy={busy}>
        Change the password
      </Button>
    </form>
  );
}
