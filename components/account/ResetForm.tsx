'use client';

import { fieldError, send } from '@/lib/client/api';
import { rawOf } from '@/lib/client/form-values';
import { goTo } from '@/lib/client/go-to';
import { useSend } from '@/lib/client/use-send';
import { AccountForm } from './AccountForm';
import { NewPasswordInput } from './NewPasswordInput';

/** Chooses a new password with the token of a link. The e-mail address is there for password managers. */
export function ResetForm({ token, email }: { token: string; email: string }) {
  const sending = useSend();
  const { failure, run } = sending;
  async function submit(form: HTMLFormElement) {
    const password = rawOf(form, 'password');
    const done = await run(() => send('POST', '/api/v1/password-resets/completion', { token, password }));
    if (done) goTo('/sign-in?after=reset');
  }
  return (
    <AccountForm fields={['password']} button="Change the password" sending={sending} onSubmit={submit} door>
      <input type="hidden" name="username" autoComplete="username" value={email} />
      <NewPasswordInput label="New password" error={fieldError(failure, 'password')} />
    </AccountForm>
  );
}
