'use client';

import { useState } from 'react';
import { Notice } from '@/components/ui/Notice';
import { TextInput } from '@/components/ui/TextInput';
import { fieldError, send } from '@/lib/client/api';
import { textOf } from '@/lib/client/form-values';
import { useSend } from '@/lib/client/use-send';
import { AccountForm } from './AccountForm';

/** Asks for a letter with a link. Says the same whether or not anybody has the address. */
export function ForgotForm() {
  const sending = useSend();
  const { failure, run } = sending;
  const [askedFor, setAskedFor] = useState<string | null>(null);
  async function submit(form: HTMLFormElement) {
    const email = textOf(form, 'email');
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
  return (
    <AccountForm fields={['email']} button="Send me a link" sending={sending} onSubmit={submit} door>
      <TextInput
        name="email"
        type="email"
        label="E-mail address"
        autoComplete="username"
        error={fieldError(failure, 'email')}
        large
      />
    </AccountForm>
  );
}
