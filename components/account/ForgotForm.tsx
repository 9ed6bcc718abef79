'use client';

import { useState, type FormEvent } from 'react';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { TextInput } from '@/components/ui/TextInput';
import { fieldError, formError, send } from '@/lib/client/api';
import { textOf } from '@/lib/client/form-values';
import { useSend } from '@/lib/client/use-send';

/** Asks for a letter with a link. Says the same whether or not anybody has the address. */
export function ForgotForm() {
  const { busy, failure, run } = useSend();
  const [askedFor, setAskedFor] = useState<string | null>(null);
  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const email = textOf(event.currentTarget, 'email');
    if (await run(() => send('POST', '/api/v1/password-resets', { email }))) setAskedFor(email);
  }
  if (askedFor) {
    return (
      <Notice tone="info" title="Look into your mail">
        If somebody here has the address {askedFor}, a letter with a link is on its way. The link works for
        one hour.
      </Notice>
    );
  }
  const error = formError(failure, ['email']);
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
      <Button type="submit" kind="primary" size="large" wide busy={busy}>
        Send me a link
      </Button>
    </form>
  );
}
