'use client';

import { TextInput } from '@/components/ui/TextInput';
import { fieldError, send } from '@/lib/client/api';
import { rawOf, textOf } from '@/lib/client/form-values';
import { goTo } from '@/lib/client/go-to';
import { signIn } from '@/lib/client/sign-in';
import { useSend } from '@/lib/client/use-send';
import { AccountForm } from './AccountForm';
import { NewPasswordInput } from './NewPasswordInput';

/** Accepts an invitation: one's name as one writes it, and a password. Signs in right away. */
export function AcceptForm({ token, name, email }: { token: string; name: string; email: string }) {
  const sending = useSend();
  const { failure, run } = sending;
  async function submit(form: HTMLFormElement) {
    const password = rawOf(form, 'password');
    const body = { token, name: textOf(form, 'name'), password };
    const accepted = await run(() => send('POST', '/api/v1/invitations/acceptance', body));
    if (!accepted) return;
    goTo((await run(() => signIn(email, password))) ? '/' : '/sign-in');
  }
  return (
    <AccountForm
      fields={['name', 'password']}
      button="Accept and sign in"
      sending={sending}
      onSubmit={submit}
      door
    >
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
    </AccountForm>
  );
}
